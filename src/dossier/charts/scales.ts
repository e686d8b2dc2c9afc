import { type ScaleContinuousNumeric, scaleLinear, scaleLog } from 'd3-scale';
import { figure } from '../../rules/figures.ts';
import { dateOf, dayNumber } from '../../series/calendar.ts';
import type { Tick } from './axes.ts';

/** Places values on one axis. */
export interface Scale {
  (value: number): number;
  readonly ticks: readonly Tick[];
}

export interface Span {
  readonly from: number;
  readonly to: number;
}

/** Linear; the domain is widened to round numbers. A domain without width gets one. */
export function linear(domain: Span, range: Span, count = 5): Scale {
  const width = domain.to - domain.from;
  const half = width > 0 ? 0 : Math.max(Math.abs(domain.from) * 0.1, 0.5);
  const scale = scaleLinear()
    .domain([domain.from - half, domain.to + half])
    .nice(count)
    .range([range.from, range.to]);
  return withTicks(scale, scale.ticks(count));
}

/** Logarithmic, both ends above zero; ticks at tens, and between them where there are few. */
export function logarithmic(domain: Span, range: Span): Scale {
  const to = domain.to > domain.from ? domain.to : domain.from * 10;
  const scale = scaleLog().domain([domain.from, to]).nice().range([range.from, range.to]);
  const tens = scale.ticks().filter((tick) => isTen(tick));
  const step = Math.ceil(tens.length / 6);
  return withTicks(
    scale,
    tens.filter((_, place) => place % step === 0),
  );
}

function isTen(value: number): boolean {
  const power = Math.log10(value);
  return Math.abs(power - Math.round(power)) < 1e-9;
}

function withTicks(scale: ScaleContinuousNumeric<number, number>, ticks: readonly number[]): Scale {
  return Object.assign((value: number) => scale(value), {
    ticks: ticks.map((tick) => ({ at: scale(tick), text: figure(tick) })),
  });
}

/** Days since 1970-01-01, ticks on 1 January of round years; of months where there are fewer than two years. */
export function overDays(days: Span, range: Span): Scale {
  const to = days.to > days.from ? days.to : days.from + 1;
  const scale = scaleLinear().domain([days.from, to]).range([range.from, range.to]);
  const years = (to - days.from) / 365.25;
  const ticks = years < 2 ? monthTicks(days.from, to) : yearTicks(days.from, to, years);
  return Object.assign((day: number) => scale(day), {
    ticks: ticks.map(({ at, text }) => ({ at: scale(at), text })),
  });
}

const mostTicks = 7;

function yearTicks(from: number, to: number, years: number): readonly Tick[] {
  const step = [1, 2, 5, 10, 20, 50, 100, 200, 500, 1000].find((one) => years / one <= mostTicks) ?? 2000;
  const ticks: Tick[] = [];
  for (let year = Math.ceil(dateOf(from).year / step) * step; dayNumber(year, 1, 1) <= to; year += step)
    if (dayNumber(year, 1, 1) >= from) ticks.push({ at: dayNumber(year, 1, 1), text: String(year) });
  return ticks;
}

function monthTicks(from: number, to: number): readonly Tick[] {
  const first = dateOf(from);
  const step = Math.max(1, Math.ceil((to - from) / 30.4 / 5));
  const ticks: Tick[] = [];
  for (let month = first.month - 1; ; month += step) {
    const year = first.year + Math.floor(month / 12);
    const at = dayNumber(year, (month % 12) + 1, 1);
    if (at > to) return ticks;
    if (at >= from) ticks.push({ at, text: `${year}-${String((month % 12) + 1).padStart(2, '0')}` });
  }
}

/** Least and largest finite value of several lists; null without any. */
export function extentOf(...lists: readonly ArrayLike<number>[]): Span | null {
  let [from, to] = [Number.POSITIVE_INFINITY, Number.NEGATIVE_INFINITY];
  for (const list of lists)
    for (let place = 0; place < list.length; place++) {
      const value = list[place] as number;
      if (value < from) from = value;
      if (value > to && value !== Number.POSITIVE_INFINITY) to = value;
    }
  return from <= to ? { from, to } : null;
}
