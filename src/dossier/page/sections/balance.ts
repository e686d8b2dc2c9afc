import type { RecomputedBalance } from '../../../facts/balances/balance-of.ts';
import { balanceFigures, type VolumeFigures } from '../../../facts/balances.ts';
import { isDefined } from '../../../hydrology/paired.ts';
import { asPrinted } from '../../../rules/evaluation/score-names.ts';
import { figure } from '../../../rules/figures.ts';
import { type Amount, balanceBars } from '../../charts/balance-bars.ts';
import { budykoAxes } from '../../charts/budyko-axes.ts';
import { type Block, facts, figures, heading, paragraph, type Text, tableOr } from '../document.ts';
import { besideStated, notStated, words } from '../say.ts';
import type { Subject } from '../subject.ts';

/** The water balance of every control volume, as stated and as the files give it. */
export function balanceSection(subject: Subject): readonly Block[] {
  const { facts: computed, key } = subject;
  const volumes = [...computed.balances];
  return [
    heading(1, 'Water balance', `${key}-balance`),
    ...(volumes.length === 0 ? [paragraph('No water balance is recorded.')] : []),
    ...volumes.flatMap(([name, volume], place) => [
      heading(2, name, `${key}-volume-${place + 1}`),
      ...oneVolume(name, volume, subject),
    ]),
  ];
}

function oneVolume(
  name: string,
  { record, recomputed, stated }: VolumeFigures,
  { facts: computed }: Subject,
): readonly Block[] {
  const fragment = computed.manifest.data.balance?.[name];
  const found = isDefined(recomputed) ? balanceFigures(recomputed.value) : new Map();
  const names = [...new Set([...stated.map((one) => one.name), ...found.keys()])];
  const rows = names.map((figureName): readonly Text[] => {
    const said = stated.find((one) => one.name === figureName);
    const computedFigure = said?.recomputed ?? found.get(figureName);
    return [
      words(figureName.replace(/^totals /, 'total of ')),
      said === undefined ? notStated : asPrinted(said.printed),
      computedFigure === undefined ? '-' : besideStated(said?.printed, computedFigure),
      said === undefined ? '-' : said.agrees ? 'yes' : { strong: 'no' },
    ];
  });
  const source = `${record}${fragment?.file === undefined ? '' : ` (${fragment.file})`}`;
  return [
    ...(isDefined(recomputed)
      ? windowOf(recomputed.value)
      : [paragraph(`Not recomputed: ${recomputed.undefined}.`)]),
    ...facts(['Storage neglected', fragment?.storage_neglected_because], ['Note', fragment?.note]),
    tableOr(
      'No figures of it are stated.',
      `Figures of ${name}`,
      ['Figure', 'Stated', 'From the files', 'Agree'],
      rows,
    ),
    ...(isDefined(recomputed)
      ? figures(bars(name, recomputed.value, source), onBudyko(name, recomputed.value, source))
      : []),
  ];
}

function windowOf({ first, last, unit }: RecomputedBalance): readonly Block[] {
  return facts(['Over', `${first} to ${last}`], ['Unit', unit === '' ? null : unit]);
}

/** What is left over stands on the side that is too short for it. */
function bars(name: string, balance: RecomputedBalance, source: string) {
  const { terms, storageChangeMm, unit } = balance;
  const onSide = (side: string): readonly Amount[] =>
    terms
      .filter((term) => term.side === side && term.total > 0)
      .map(({ name: term, total }) => ({ name: term, amount: total }));
  const change = storageChangeMm ?? 0;
  const stored =
    Math.abs(change) > 0
      ? [{ name: change > 0 ? 'kept in stores' : 'taken from stores', amount: Math.abs(change) }]
      : [];
  const into = [...onSide('inflow'), ...(change < 0 ? stored : [])];
  const out = [...onSide('outflow'), ...(change > 0 ? stored : [])];
  const sum = (amounts: readonly Amount[]) => amounts.reduce((total, { amount }) => total + amount, 0);
  const residual = sum(into) - sum(out);
  const isSeen = Math.abs(residual) > 1e-6 * sum(into);
  const rest = isSeen ? [{ name: 'not accounted for', amount: Math.abs(residual) }] : [];
  return balanceBars(
    { in: residual < 0 ? [...into, ...rest] : into, out: residual > 0 ? [...out, ...rest] : out },
    {
      title: `${name}: water in, water out and kept`,
      unit,
      summary: `In ${figure(sum(into))} ${unit}, out and kept ${figure(sum(out))} ${unit}; ${isSeen ? `${figure(residual)} ${unit} are not accounted for` : 'nothing is left over'}.`,
      source,
    },
  );
}

function onBudyko(name: string, { aridity, evaporativeRatio }: RecomputedBalance, source: string) {
  if (!isDefined(aridity) || !isDefined(evaporativeRatio)) return null;
  return budykoAxes({ aridity: aridity.value, evaporativeRatio: evaporativeRatio.value }, { name, source });
}
