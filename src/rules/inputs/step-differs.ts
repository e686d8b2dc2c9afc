import type { AbsentSteps } from '../../facts/profiles/file-profile.ts';
import type { Place } from '../../facts/profiles/places.ts';
import type { ProfiledFile } from '../../facts/profiles.ts';
import { secondsOfDay } from '../../series/calendar.ts';
import { formatStep, type Step } from '../../series/step.ts';
import type { Listed } from '../../series/table.ts';
import { figure } from '../figures.ts';
import { type Draft, rule } from '../rule.ts';
import { listPlaces } from './data-place.ts';

export const inputsStepDiffers = rule({
  id: 'inputs.step-differs',
  scope: 'inputs',
  from: 'calibration',
  means: 'contradicted',
  statement:
    'The stated time step does not hold: days repeated, missing, out of order or off the step. Grab samples state `step: irregular`.',
  why: 'A doubled day rains twice, a left-out one shifts all that follow in a model that counts rows; both pass unseen through totals and means.',
  source: {
    basis: 'definition',
    citation: 'Follows from the words: a step is the time from each row to the next.',
  },
  clear:
    'Mend the rows (write missing days with their code for a missing value), correct `series.step`, or say `step: irregular` for samples.',
  check: ({ id, name }, { profiles }) => {
    const { step = null, files = [] } = profiles.get(name ?? '') ?? {};
    if (step === null || step.kind === 'irregular') return [];
    return files.flatMap((file) =>
      faultsOf(file, step).map(
        ({ subject, line, message }): Draft => ({
          record: id,
          file: file.path,
          line,
          subject: `${file.path} ${subject}`,
          stated: formatStep(step),
          message: `${file.path} ${message}.`,
        }),
      ),
    );
  },
});

type Regular = Exclude<Step, { kind: 'irregular' }>;

interface Fault {
  readonly subject: string;
  readonly line: number;
  readonly message: string;
}

function faultsOf(file: ProfiledFile, step: Regular): readonly Fault[] {
  const { rows, repeated, outOfOrder, offStep, absent, problems, usualSeconds } = file;
  const name = formatStep(step);
  const fault = (subject: string, { first: [first] }: Listed<Place>, message: string): readonly Fault[] =>
    first === undefined ? [] : [{ subject, line: first.line, message }];
  const closer = repeated.total > rows / 2 ? `; its rows stand closer than ${name}` : '';
  const order = [
    fault(
      'repeated',
      repeated,
      `has ${rowsOf(repeated.total)} for a time that an earlier row has: ${listPlaces(repeated)}${closer}`,
    ),
    fault(
      'out of order',
      outOfOrder,
      `has ${rowsOf(outOfOrder.total)} out of order of time: ${listPlaces(outOfOrder)}`,
    ),
  ].flat();
  if (usualSeconds > 0 && !isUsual(usualSeconds, step)) {
    const first = absent.total > 0 ? absent : offStep;
    return [
      ...order,
      ...fault('step', first, `has rows that are mostly ${apart(usualSeconds)} apart, not ${name}`),
    ];
  }
  return [
    ...order,
    ...fault(
      'off the step',
      offStep,
      `has ${rowsOf(offStep.total)} off the step of ${name} that its first row begins: ${listPlaces(offStep)}`,
    ),
    // A row that can't be read leaves its step without one; its own rule says so.
    ...(absent.total > problems.total
      ? fault(
          'absent',
          absent,
          absent.total === 1
            ? `lacks the row of ${listAbsent(absent)}`
            : `lacks rows for ${figure(absent.total)} steps of ${name}: ${listAbsent(absent)}`,
        )
      : []),
  ];
}

function rowsOf(count: number): string {
  return count === 1 ? 'a row' : `${figure(count)} rows`;
}

function listAbsent({ total, first }: Listed<AbsentSteps>): string {
  const shown = first.slice(0, 3);
  const more = total - shown.reduce((sum, { steps }) => sum + steps, 0);
  const told = shown.map(
    ({ from, time, line }) => `${from === time ? from : `${from} to ${time}`} (before line ${line})`,
  );
  return `${told.join(', ')}${more > 0 ? ` and ${figure(more)} more` : ''}`;
}

function isUsual(seconds: number, { kind, length }: Regular): boolean {
  if (kind === 'seconds') return seconds === length;
  const days = seconds / secondsOfDay;
  return days >= 28 * length && days <= 31 * length;
}

function apart(seconds: number): string {
  const days = seconds / secondsOfDay;
  if (days >= 28 && days <= 31) return 'a month';
  return days >= 365 && days <= 366 ? 'a year' : formatStep({ kind: 'seconds', length: seconds });
}
