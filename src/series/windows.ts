import { secondsOfDay, type Window } from './calendar.ts';

/** A span from a time up to, not including, another. */
export interface Span {
  readonly fromSeconds: number;
  readonly untilSeconds: number;
}

/** The days of any of the windows but none of `leftOut`, as spans in order that neither touch nor overlap. */
export function spansOf(windows: readonly Window[], leftOut: readonly Window[]): readonly Span[] {
  const inOrder = windows.toSorted((one, other) => one.firstDay - other.firstDay);
  let days: Window[] = [];
  for (const window of inOrder) {
    const before = days.at(-1);
    if (before === undefined || window.firstDay > before.lastDay + 1) days.push(window);
    else days[days.length - 1] = { ...before, lastDay: Math.max(before.lastDay, window.lastDay) };
  }
  for (const out of leftOut)
    days = days.flatMap((window) =>
      [
        { firstDay: window.firstDay, lastDay: Math.min(window.lastDay, out.firstDay - 1) },
        { firstDay: Math.max(window.firstDay, out.lastDay + 1), lastDay: window.lastDay },
      ].filter((rest) => rest.firstDay <= rest.lastDay),
    );
  return days.map(({ firstDay, lastDay }) => ({
    fromSeconds: firstDay * secondsOfDay,
    untilSeconds: (lastDay + 1) * secondsOfDay,
  }));
}
