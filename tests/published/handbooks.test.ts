import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { handbookOrder } from '../../src/hydrology/parameters/handbook-order.ts';
import {
  type HandbookTableName,
  handbookClasses,
  handbookRange,
} from '../../src/hydrology/parameters/handbook-range.ts';
import {
  antecedentRunoff,
  curveNumbers,
  type SoilGroup,
  soilGroups,
} from '../../src/hydrology/tables/curve-numbers.ts';
import { manningN } from '../../src/hydrology/tables/manning-n.ts';
import { saturatedConductivity } from '../../src/hydrology/tables/saturated-conductivity.ts';

type Cell = string | number | null;
interface Published {
  readonly source: string;
  readonly rows: readonly (readonly Cell[])[];
}

const published = JSON.parse(readFileSync('tests/published/data/handbooks.json', 'utf8')) as {
  readonly curve_numbers: Published;
  readonly antecedent_runoff: Published;
  readonly manning_n: Published;
  readonly saturated_conductivity: readonly [rawls: Published, carsel: Published];
};

describe('curve numbers: TR-55 (1986), Table 2-2, pp. 2-5 to 2-7 (pages from memory)', () => {
  it.each(published.curve_numbers.rows.map((row, place) => ({ row, place })))(
    'row $place: $row',
    ({ row, place }) => {
      const { table, sealedPercent, numbers } = curveNumbers[place] ?? {};
      const [of, , , , sealed, ...values] = row;
      expect([table, sealedPercent, ...Object.values(numbers ?? {})]).toEqual([of, sealed, ...values]);
    },
  );

  it('has these rows and no others, each class once', () => {
    expect(curveNumbers).toHaveLength(published.curve_numbers.rows.length);
    expect(new Set(handbookClasses('curve-number')).size).toBe(curveNumbers.length);
  });

  it('antecedent runoff: NEH-4 (1985), Table 10.1', () => {
    expect(antecedentRunoff).toEqual([...published.antecedent_runoff.rows].reverse());
  });

  it('rises strictly from group A to D but where all is sealed or paved with stones', () => {
    for (const { class: name, numbers } of curveNumbers) {
      const [a, b, c, d] = soilGroups.map((group) => numbers[group]);
      if (name.startsWith('paved parking') || name.startsWith('artificial desert'))
        expect(new Set([a, b, c, d]).size, name).toBe(1);
      else
        expect([a, b, c, d], name).toEqual(
          [...new Set([a, b, c, d])].sort((one, other) => Number(one) - Number(other)),
        );
    }
  });

  it('sealed ground is above grass in every condition, on every soil group', () => {
    for (const condition of ['poor', 'fair', 'good'])
      for (const group of soilGroups)
        expect(numberOf('paved parking, roofs, streets with curbs', group)).toBeGreaterThan(
          numberOf(`open space, ${condition}`, group),
        );
  });

  it('every relation that is enforced holds for every two published rows', () => {
    const met = new Set<string>();
    for (const low of curveNumbers)
      for (const high of curveNumbers)
        for (const soilGroup of soilGroups) {
          const order = handbookOrder(
            'curve-number',
            { class: low.class, soilGroup },
            { class: high.class, soilGroup },
          );
          if (order === null) continue;
          met.add(order.states);
          const [less, more] = [low.numbers[soilGroup], high.numbers[soilGroup]];
          const about = `${low.class} ${less}, ${high.class} ${more}, group ${soilGroup}: ${order.states}`;
          if (order.orEqual) expect(less, about).toBeLessThanOrEqual(more);
          else expect(less, about).toBeLessThan(more);
        }
    expect(met.size, 'relations between classes').toBe(7);
  });

  it.each([
    ['pasture above woods, across conditions', 'woods, poor', 'pasture, good'],
    [
      'row crops above legumes, on group D',
      'close-seeded legumes or rotation meadow, contoured and terraced, poor',
      'row crops, contoured and terraced, poor',
    ],
    [
      'small grain above legumes',
      'close-seeded legumes or rotation meadow, straight row, poor',
      'small grain, straight row, poor',
    ],
  ])('%s is broken by the table itself and not enforced', (_, low, high) => {
    expect(soilGroups.some((group) => numberOf(low, group) > numberOf(high, group))).toBe(true);
    for (const soilGroup of soilGroups) {
      expect(handbookOrder('curve-number', { class: low, soilGroup }, { class: high, soilGroup })).toBeNull();
      expect(handbookOrder('curve-number', { class: high, soilGroup }, { class: low, soilGroup })).toBeNull();
    }
  });
});

describe('Manning n: Chow (1959), Table 5-6, pp. 110-113', () => {
  it.each(published.manning_n.rows.map((row, place) => ({ row, place })))(
    'row $place: $row',
    ({ row, place }) => {
      const [, , ...values] = row;
      const { lowest, normal, highest } = manningN[place] ?? {};
      expect([lowest, normal, highest]).toEqual(values);
    },
  );

  it('has these rows and no others, each class once, its three numbers in order', () => {
    expect(manningN).toHaveLength(published.manning_n.rows.length);
    expect(new Set(handbookClasses('manning-n')).size).toBe(manningN.length);
    for (const { class: name, lowest, normal, highest } of manningN) {
      expect(lowest, name).toBeGreaterThan(0);
      expect(normal ?? lowest, name).toBeGreaterThanOrEqual(lowest);
      expect(highest ?? Number.POSITIVE_INFINITY, name).toBeGreaterThanOrEqual(normal ?? lowest);
    }
  });
});

describe('saturated conductivity', () => {
  const [rawls, carsel] = published.saturated_conductivity;

  it.each(rawls.rows)('Rawls et al. (1982), Table 2, pp. 1316-1320: %s %d mm/h', (texture, value) => {
    expect(saturatedConductivity.find((row) => row.class === texture)?.rawlsMmPerHour).toBe(value);
  });

  it.each(carsel.rows)('Carsel & Parrish (1988), class means: %s %d cm/d', (texture, value) => {
    expect(saturatedConductivity.find((row) => row.class === texture)?.carselCmPerDay).toBe(value);
  });

  it('has these rows and no others', () => {
    expect(saturatedConductivity.map((row) => row.class)).toEqual(carsel.rows.map(([texture]) => texture));
    expect(saturatedConductivity.filter((row) => row.rawlsMmPerHour !== null)).toHaveLength(
      rawls.rows.length,
    );
  });

  it('falls with every finer texture by Rawls, and not by Carsel & Parrish, so that is not enforced', () => {
    const falling = rawls.rows.map(([, value]) => Number(value));
    expect(falling).toEqual([...falling].sort((one, other) => other - one));
    const of = (texture: string) => carsel.rows.find(([name]) => name === texture)?.[1] ?? Number.NaN;
    expect(Number(of('clay'))).toBeGreaterThan(Number(of('silty clay')));
    expect(Number(of('sandy clay loam'))).toBeGreaterThan(Number(of('loam')));
    for (const [one, other] of [
      ['clay', 'silty clay'],
      ['loam', 'sandy clay loam'],
    ] as const)
      for (const [low, high] of [
        [one, other],
        [other, one],
      ] as const)
        expect(handbookOrder('saturated-conductivity', { class: low }, { class: high })).toBeNull();
  });
});

describe('relations of Manning n and of conductivity', () => {
  it.each(['manning-n', 'saturated-conductivity'] as const)('hold for every two rows of %s', (table) => {
    let relations = 0;
    const classes = handbookClasses(table);
    for (const low of classes)
      for (const high of classes) {
        if (handbookOrder(table, { class: low }, { class: high }) === null) continue;
        relations++;
        for (const [less, more] of valuesOf(table, low, high))
          expect(less, `${low}, ${high}`).toBeLessThan(more);
      }
    // All pairs of the chain of five, and three pairs; 5 clays below 3 sands, and 3 pairs of sands.
    expect(relations).toBe(table === 'manning-n' ? 10 + 2 + 1 : 15 + 3);
  });
});

describe('the range of a class', () => {
  it('is the row of Manning n', () => {
    expect(
      handbookRange('manning-n', { class: 'Earth, winding and sluggish, grass, some weeds' }),
    ).toMatchObject({
      value: { low: 0.025, high: 0.033, unit: null },
    });
    // Chow prints a dash for the maximum.
    expect(handbookRange('manning-n', { class: 'lined or built-up, asphalt, smooth' })).toMatchObject({
      value: { low: 0.013, high: null },
    });
  });

  it('of a curve number goes from dry to wet before the storm', () => {
    // TR-55: open space, fair, D = 84; NEH-4 Table 10.1: 80 -> 63, 91; 90 -> 78, 96; between: 63 + 0.4 x 15, 91 + 0.4 x 5.
    const range = handbookRange('curve-number', { class: 'open space, fair', soilGroup: 'D' });
    expect(range).toMatchObject({
      value: { low: expect.closeTo(69, 9), high: expect.closeTo(93, 9), unit: '1' },
    });
    // Half sealed: 84 + 0.5 x (98 - 84) = 91; 78 + 0.1 x 22, 96 + 0.1 x 4.
    const sealed = handbookRange('curve-number', {
      class: 'open space, fair',
      soilGroup: 'D',
      sealedShare: 0.5,
    });
    expect(sealed).toMatchObject({ value: { low: expect.closeTo(80.2, 9), high: expect.closeTo(96.4, 9) } });
    // TR-55: "use CN = 30" where the true value is below.
    expect(handbookRange('curve-number', { class: 'woods, good' })).toMatchObject({ value: { low: 30 } });
  });

  it('of conductivity is a hundred times around both surveys', () => {
    // Clay: Rawls 0.6 mm/h; Carsel & Parrish 4.8 cm/d = 2 mm/h.
    expect(handbookRange('saturated-conductivity', { class: 'clay' })).toMatchObject({
      value: { low: expect.closeTo(0.006, 9), high: expect.closeTo(200, 9), unit: 'mm/h' },
    });
    expect(handbookRange('saturated-conductivity', { class: 'silt' })).toMatchObject({
      value: { low: expect.closeTo(0.025, 9), high: expect.closeTo(250, 9) },
    });
  });

  it('is undefined for a class that the table does not have', () => {
    for (const table of ['manning-n', 'curve-number', 'saturated-conductivity'] as const)
      expect(handbookRange(table, { class: 'moss' })).toEqual({ undefined: 'the table has no class "moss"' });
  });
});

describe('curve numbers of one class', () => {
  it('rise with the soil group and with the sealed share, and are not compared otherwise', () => {
    const of = (soilGroup?: SoilGroup, sealedShare?: number) => ({
      class: 'open space, good',
      soilGroup,
      sealedShare,
    });
    expect(handbookOrder('curve-number', of('A'), of('C'))).toMatchObject({ orEqual: true });
    expect(handbookOrder('curve-number', of('C'), of('A'))).toBeNull();
    expect(handbookOrder('curve-number', of('A', 0.1), of('C', 0.4))).toBeNull();
    expect(handbookOrder('curve-number', of('B', 0.1), of('B', 0.4))).toMatchObject({ orEqual: true });
    expect(handbookOrder('curve-number', of(), of('C'))).toBeNull();
    expect(
      handbookOrder('curve-number', of('B', 0.4), { class: 'residential, 2 acres', soilGroup: 'B' }),
    ).toBeNull();
  });
});

function numberOf(name: string, group: SoilGroup): number {
  const row = curveNumbers.find((one) => one.class === name);
  if (row === undefined) throw new Error(`no class ${name}`);
  return row.numbers[group];
}

/** Published values of two classes, those of one survey side by side. */
function valuesOf(table: HandbookTableName, low: string, high: string): readonly [number, number][] {
  if (table === 'manning-n') {
    const normal = (name: string) => manningN.find((row) => row.class === name)?.normal ?? Number.NaN;
    return [[normal(low), normal(high)]];
  }
  const row = (name: string) => saturatedConductivity.find((one) => one.class === name);
  return [
    [row(low)?.rawlsMmPerHour ?? Number.NaN, row(high)?.rawlsMmPerHour ?? Number.NaN],
    [row(low)?.carselCmPerDay ?? Number.NaN, row(high)?.carselCmPerDay ?? Number.NaN],
  ];
}
