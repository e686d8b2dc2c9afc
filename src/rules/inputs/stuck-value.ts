import type { ColumnProfile, EqualRun } from '../../facts/profiles/column-profile.ts';
import type { ProfiledFile } from '../../facts/profiles.ts';
import type { Input } from '../../manifest/data.generated.ts';
import { secondsOfDay } from '../../series/calendar.ts';
import type { Step } from '../../series/step.ts';
import { figure } from '../figures.ts';
import { type Draft, type Limits, rule } from '../rule.ts';
import { columnIn } from './data-place.ts';

export const inputsStuckValue = rule({
  id: 'inputs.stuck-value',
  scope: 'inputs',
  from: 'warn',
  means: null,
  statement:
    'One value other than zero stands in rain, temperature or flow for many steps in a row (and for a day at least), or no rain falls for far longer than ever else in the record.',
  why: 'A gauge that is stuck, frozen or blocked goes on reporting; so does a series that somebody filled by hand. The model is then calibrated on weather that did not happen.',
  source: {
    basis: 'practice',
    citation:
      'Persistence checks of WMO-No. 305, Guide on the Global Data-Processing System; the lengths are our choice',
  },
  clear:
    'Look at the days named: set stuck values to missing and say so in `preparation`, or say in `note` why they are right (a constant release, a drought).',
  limits: {
    equal_rain_steps: {
      default: 5,
      unit: 'steps',
      states: 'Rain of one equal amount in so many steps in a row is doubted.',
      looser: 'higher',
    },
    equal_temperature_steps: {
      default: 8,
      unit: 'steps',
      states: 'One equal temperature in so many steps in a row is doubted.',
      looser: 'higher',
    },
    equal_flow_steps: {
      default: 20,
      unit: 'steps',
      states: 'One equal flow in so many steps in a row is doubted.',
      looser: 'higher',
    },
    dry_spell_ratio: {
      default: 3,
      unit: '1',
      states: 'The longest time without rain is doubted when it is so many times as long as the next.',
      looser: 'higher',
    },
    dry_spell_steps: {
      default: 60,
      unit: 'steps',
      states: 'A shorter time without rain is never doubted.',
      looser: 'higher',
    },
  },
  check: ({ id, name, fragment: { role } }, { profiles }, limits) => {
    const { files = [], step = null } = profiles.get(name ?? '') ?? {};
    const longest = longestOf(role, limits);
    if (longest === null || step === null || step.kind === 'irregular') return [];
    return files.flatMap((file) =>
      file.columns.flatMap((column) => [
        ...equalRuns(id, file, column, Math.max(longest, stepsInDay(step))),
        ...(role === 'precipitation' ? drySpell(id, file, column, limits) : []),
      ]),
    );
  },
});

function longestOf(role: Input['role'], limits: Limits): number | null {
  if (role === 'precipitation') return limits.equal_rain_steps ?? null;
  if (role === 'temperature') return limits.equal_temperature_steps ?? null;
  return role === 'streamflow' ? (limits.equal_flow_steps ?? null) : null;
}

function stepsInDay({ kind, length }: Exclude<Step, { kind: 'irregular' }>): number {
  return kind === 'seconds' ? secondsOfDay / length : 0;
}

function equalRuns(
  record: string,
  file: ProfiledFile,
  column: ColumnProfile,
  longest: number,
): readonly Draft[] {
  const [first, ...others] = column.equalRuns.filter(
    ({ steps, value }) => steps >= longest && !column.suspectedCodes.some((code) => code.value === value),
  );
  if (first === undefined) return [];
  return [
    {
      record,
      file: file.path,
      line: first.first.line,
      subject: `${file.path} ${column.name}`,
      found: first.steps,
      unit: 'steps',
      message: `${columnIn(file, column)} holds ${first.value} in ${figure(first.steps)} steps in a row, ${spanOf(first)}.`,
      detail: others.map((run) => `${run.value} in ${figure(run.steps)} steps in a row, ${spanOf(run)}`),
    },
  ];
}

function drySpell(
  record: string,
  file: ProfiledFile,
  column: ColumnProfile,
  limits: Limits,
): readonly Draft[] {
  const { longest, nextSteps } = column.drySpells ?? {};
  if (longest === undefined || nextSteps === undefined) return [];
  const { dry_spell_ratio: ratio = 0, dry_spell_steps: fewest = 0 } = limits;
  if (longest.steps < fewest || longest.steps < ratio * nextSteps) return [];
  return [
    {
      record,
      file: file.path,
      line: longest.first.line,
      subject: `${file.path} ${column.name} dry`,
      found: longest.steps,
      unit: 'steps',
      message: `${columnIn(file, column)} has no rain in ${figure(longest.steps)} steps in a row, ${spanOf(longest)}; the next longest time without rain in this record is ${figure(nextSteps)}. A blocked gauge reads the same.`,
    },
  ];
}

function spanOf({ first, last }: EqualRun): string {
  return `${first.time} to ${last.time} (lines ${first.line} to ${last.line})`;
}
