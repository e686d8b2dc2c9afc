import { mean } from '../arithmetic.ts';
import { defined, type Paired, pairInOrder, type Statistic, undefinedBecause } from '../paired.ts';
import { calendarMonth } from './calendar-month.ts';

/**
 * Monthly climatology of both sides: the mean of all Januaries, of all Februaries and so on.
 *
 * Formula: mean over the pairs of a calendar month
 * Inputs: pairs of complete months, any unit; results in that unit.
 * Range: twelve pairs, January first, their times 0 to 11.
 * Read: the season without the years. Two forcings in one climate agree here even when their years do not.
 * Undefined: a calendar month without any pair.
 * Source: definition.
 * Example: climatology(pairInOrder({observed: [1], simulated: [1]})) -> {undefined: 'no pair falls in month 2'}
 */
export function climatology(monthly: Paired): Statistic<Paired> {
  const observed: number[] = [];
  const simulated: number[] = [];
  const months = monthly.times.map(calendarMonth);
  for (let month = 0; month < 12; month++) {
    const inMonth = (_: number, index: number) => months[index] === month;
    const here = monthly.observed.filter(inMonth);
    if (here.length === 0) return undefinedBecause(`no pair falls in month ${month + 1}`);
    observed.push(mean(here));
    simulated.push(mean(monthly.simulated.filter(inMonth)));
  }
  return defined(pairInOrder({ observed, simulated }));
}
