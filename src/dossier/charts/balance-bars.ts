import { figure } from '../../rules/figures.ts';
import { type Chart, chart, chartWidth } from './chart.ts';
import { element, label, short, shortened } from './markup.ts';

export interface Amount {
  readonly name: string;
  /** Above zero. */
  readonly amount: number;
}

/** What came into a volume beside what left it or stayed, on one scale, each part with its number. Null where nothing flowed. */
export function balanceBars(
  sides: { readonly in: readonly Amount[]; readonly out: readonly Amount[] },
  of: { readonly title: string; readonly unit: string; readonly summary: string; readonly source: string },
): Chart | null {
  const total = (side: readonly Amount[]) => side.reduce((sum, { amount }) => sum + amount, 0);
  const widest = Math.max(total(sides.in), total(sides.out));
  if (!(widest > 0)) return null;
  const scale = (amount: number) => (amount * (chartWidth - 8)) / widest;
  const all = [...sides.in, ...sides.out];
  const bar = (side: readonly Amount[], y: number, heading: string) => {
    let x = 4;
    const parts = side.map((part) => {
      const width = scale(part.amount);
      const number = all.indexOf(part) + 1;
      const box = element('path', {
        class: `part shade${number % 4}`,
        d: `M${short(x)} ${y}h${short(width)}v26h-${short(width)}z`,
      });
      const named =
        width < 14
          ? ''
          : label(x + width / 2, y + 17, String(number), { class: 'part-number', 'text-anchor': 'middle' });
      x += width;
      return box + named;
    });
    return (
      label(4, y - 6, `${heading}: ${figure(total(side))} ${of.unit}`, { class: 'key' }) + parts.join('')
    );
  };
  const rows = all.map(({ name, amount }, place) => {
    const y = 128 + place * 18;
    const box = element('path', { class: `part shade${(place + 1) % 4}`, d: `M4 ${y - 10}h20v13h-20z` });
    const share = `${((100 * amount) / widest).toFixed(1)} %`;
    return (
      box +
      label(14, y, String(place + 1), { class: 'part-number', 'text-anchor': 'middle' }) +
      label(32, y, shortened(name, 30), { class: 'key' }) +
      label(chartWidth - 64, y, `${figure(amount)} ${of.unit}`, { class: 'key', 'text-anchor': 'end' }) +
      label(chartWidth - 4, y, share, { class: 'key', 'text-anchor': 'end' })
    );
  });
  return chart(
    of,
    128 + all.length * 18,
    bar(sides.in, 22, 'In') + bar(sides.out, 78, 'Out and kept') + rows.join(''),
  );
}
