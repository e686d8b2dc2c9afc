import type { BandOver } from '../../facts/bands/band-over.ts';
import type { Quantity } from '../../facts/conditions.ts';
import type { Facts } from '../../facts/facts.ts';
import type { ComparedFigure } from '../../facts/stated-figure.ts';
import { isDefined, type Statistic } from '../../hydrology/paired.ts';
import { formatDate, type Window } from '../../series/calendar.ts';

/** A computed number to twelve digits, or why there is none. */
type Figure = number | { readonly undefined: string };

/** What was computed about a study, by the names that its manifest gives. */
export function figuresOf(facts: Facts): object {
  return {
    readings: facts.readings.map(({ name, record, file, line, stated, found, agrees, problem }) => ({
      of: name,
      record,
      file,
      line,
      stated,
      found,
      agrees,
      problem,
    })),
    profiles: profilesOf(facts),
    scores: scoresOf(facts),
    balances: balancesOf(facts),
    bands: bandsOf(facts),
    conditions: named(facts.scenarios.conditions, quantity),
    scenarios: named(facts.scenarios.cases, ({ drivers }) =>
      named(drivers, (driver) => ({
        ...quantity(driver),
        change_percent: isDefined(driver.reach) ? figure(driver.reach.value.changePercent) : driver.reach,
        outside_calibrated_range: isDefined(driver.reach) ? driver.reach.value.outside.length : driver.reach,
      })),
    ),
  };
}

function profilesOf({ profiles }: Facts): object {
  return named(profiles, ({ files, days, annualMm }) => ({
    days: span(days),
    annual_mm: annualMm === null ? null : rounded(annualMm),
    files: files.map((file) => ({
      path: file.path,
      rows: file.rows,
      days: span(file.days),
      columns: file.columns.map(({ name, values, missing, absent, total, lowest, highest }) => ({
        name,
        values,
        missing,
        absent,
        total: rounded(total),
        lowest: lowest === null ? null : rounded(lowest.value),
        highest: highest === null ? null : rounded(highest.value),
      })),
    })),
  }));
}

function scoresOf({ scores }: Facts): object {
  return named(scores, ({ recomputed, stated }) => ({
    ...told(recomputed, ({ step, unit, windows }) => ({
      step,
      unit,
      windows: named(Object.entries(windows), (window) =>
        told(window, ({ periods, pairs, windowSteps }) => ({ periods, pairs, steps: windowSteps })),
      ),
    })),
    figures: stated.map((one) => ({
      window: one.window,
      score: one.score,
      stated: one.printed.value,
      recomputed: figure(one.recomputed),
      agrees: one.agrees,
    })),
  }));
}

function balancesOf({ balances }: Facts): object {
  return named(balances, ({ recomputed, stated }) => ({
    ...told(recomputed, ({ unit, first, last, terms, ...balance }) => ({
      unit,
      first,
      last,
      terms: terms.map(({ side, name, total }) => ({ side, name, total: rounded(total) })),
      storage_change: balance.storageChangeMm === null ? null : rounded(balance.storageChangeMm),
      residual: rounded(balance.residualMm),
      residual_share: figure(balance.residualShare),
      runoff_ratio: figure(balance.runoffRatio),
      evaporative_ratio: figure(balance.evaporativeRatio),
      aridity: figure(balance.aridity),
    })),
    figures: compared(stated),
  }));
}

function bandsOf({ bands }: Facts): object {
  const over = ({ coverage, relativeWidth, steps }: BandOver) => ({
    steps,
    coverage: figure(coverage),
    relative_width: figure(relativeWidth),
  });
  return named(
    bands.map((band) => [band.target, band] as const),
    ({ fragment, over: window, recomputed, stated }) => ({
      level: fragment.level ?? null,
      over: window,
      ...told(recomputed, (band) => told(band.stated, over)),
      figures: compared(stated),
    }),
  );
}

function quantity({ figures }: Quantity): object {
  return told(figures, ({ values, mean, lowest, highest, p10, p90 }) => ({
    count: values.length,
    mean: rounded(mean),
    lowest: rounded(lowest),
    highest: rounded(highest),
    p10: rounded(p10),
    p90: rounded(p90),
  }));
}

function compared(stated: readonly ComparedFigure[]): readonly object[] {
  return stated.map(({ name, printed, recomputed, agrees }) => ({
    name,
    stated: printed.value,
    recomputed: figure(recomputed),
    agrees,
  }));
}

function told<T>(statistic: Statistic<T>, tell: (value: T) => object): object {
  return isDefined(statistic) ? tell(statistic.value) : statistic;
}

function figure(statistic: Statistic): Figure {
  return isDefined(statistic) ? rounded(statistic.value) : statistic;
}

/** Further digits, and what lies below 1e-12, are the arithmetic's own and need not be the same on every machine. */
function rounded(value: number): number {
  return Math.abs(value) < 1e-12 ? 0 : Number(value.toPrecision(12));
}

function span(days: Window | null): string | null {
  return days === null ? null : `${formatDate(days.firstDay)}/${formatDate(days.lastDay)}`;
}

/** An object with a key for each name, `__proto__` too. */
function named<T>(entries: Iterable<readonly [string, T]>, tell: (value: T) => unknown): object {
  return Object.fromEntries([...entries].map(([name, value]) => [name, tell(value)]));
}
