import { curveNumberOrder } from './curve-number-order.ts';
import type { HandbookClass, HandbookTableName } from './handbook-range.ts';

/** Why one class has no greater value than another; `orEqual` where the published values may be equal. */
export interface HandbookOrder {
  readonly states: string;
  readonly orEqual: boolean;
}

/**
 * The published relation by which the first class has the smaller value; null where none holds in the whole table.
 *
 * Formula: the relations below, each of which every published row keeps
 * Inputs: two classes of one table; curve numbers on one soil group, or one class on two soil groups.
 * Range: a relation, or null.
 * Read: what the published tables themselves break is no relation here: pasture above woods across conditions (good pasture 39, poor
 * woods 45), row crops above legumes on group D, small grain above legumes, conductivity that falls with every finer texture.
 * Undefined: never.
 * Source: Chow 1959, Table 5-6; TR-55 1986, Table 2-2; Rawls et al. 1982, Table 2; Carsel & Parrish 1988.
 * Example: handbookOrder('saturated-conductivity', {class: 'clay'}, {class: 'sand'}) -> {states: 'coarse soils drain faster', orEqual: false}
 */
export function handbookOrder(
  table: HandbookTableName,
  smaller: HandbookClass,
  greater: HandbookClass,
): HandbookOrder | null {
  if (table !== 'curve-number') {
    const order = chains[table].find(({ rising }) => isBelow(rising, smaller.class, greater.class));
    return order === undefined ? null : { states: order.states, orEqual: false };
  }
  return curveNumberOrder(smaller, greater);
}

interface Chain {
  readonly states: string;
  /** Classes from the smallest value to the greatest; those of one place are not compared. */
  readonly rising: readonly (readonly string[])[];
}

const chains: Readonly<Record<Exclude<HandbookTableName, 'curve-number'>, readonly Chain[]>> = {
  'manning-n': [
    {
      states: 'a lined channel is smoother than an earth one, a clean one smoother than a weedy one',
      rising: [
        ['lined or built-up, concrete, trowel finish'],
        ['earth, straight and uniform, clean, recently completed'],
        ['minor stream on plain, clean, straight, full stage, no rifts or deep pools'],
        ['minor stream on plain, sluggish reaches, weedy, deep pools'],
        ['flood plain, brush, medium to dense brush, summer'],
      ],
    },
    {
      states: 'high grass is rougher than short',
      rising: [
        ['flood plain, pasture, no brush, short grass'],
        ['flood plain, pasture, no brush, high grass'],
      ],
    },
    {
      states: 'dense brush is rougher than scattered',
      rising: [
        ['flood plain, brush, scattered brush, heavy weeds'],
        ['flood plain, brush, medium to dense brush, summer'],
      ],
    },
    {
      states: 'timber is rougher where the flood reaches its branches',
      rising: [
        [
          'flood plain, trees, heavy stand of timber, few down trees, little undergrowth, flood stage below branches',
        ],
        [
          'flood plain, trees, heavy stand of timber, few down trees, little undergrowth, flood stage reaching branches',
        ],
      ],
    },
  ],
  'saturated-conductivity': [
    {
      states: 'coarse soils drain faster',
      rising: [
        ['clay', 'silty clay', 'sandy clay', 'silty clay loam', 'clay loam'],
        ['sandy loam'],
        ['loamy sand'],
        ['sand'],
      ],
    },
  ],
};

function isBelow(rising: Chain['rising'], smaller: string, greater: string): boolean {
  const place = (name: string) => rising.findIndex((classes) => classes.includes(name.trim().toLowerCase()));
  return place(smaller) >= 0 && place(smaller) < place(greater);
}
