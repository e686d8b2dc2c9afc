import { isDefined, type Statistic } from '../../hydrology/paired.ts';
import type { PrintedNumber } from '../../hydrology/stated/printed-number.ts';
import { figure } from '../../rules/figures.ts';

export const notStated = 'not stated';

/** A figure, or why there is none. */
export function figureOr(statistic: Statistic, unit = ''): string {
  if (!isDefined(statistic)) return `none: ${statistic.undefined}`;
  const value = Math.abs(statistic.value) < roundingError ? 0 : statistic.value;
  return `${figure(value)}${unit === '' ? '' : ` ${unit}`}`;
}

/** What adding up in another order changes; nobody wants to read it. */
const roundingError = 1e-12;

/** A recomputed figure with one decimal more than the stated one, or why there is none. */
export function besideStated(stated: PrintedNumber | undefined, statistic: Statistic): string {
  if (stated === undefined || !isDefined(statistic)) return figureOr(statistic);
  const decimals = Math.min(20, Math.max(0, stated.decimals + 1));
  return (Number(statistic.value.toFixed(decimals)) + 0).toFixed(decimals);
}

export function yesOrNo(value: boolean | undefined): string {
  return value === undefined ? notStated : value ? 'yes' : 'no';
}

/** `streamflow`, `soil water`: a name of the manifest as people say it. */
export function words(name: string): string {
  return name.replaceAll('_', ' ');
}

/** First letter as at the start of a sentence. */
export function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}

/** `1 record`, `12 records`. */
export function count(number: number, noun: string): string {
  return `${figure(number)} ${noun}${number === 1 ? '' : 's'}`;
}
