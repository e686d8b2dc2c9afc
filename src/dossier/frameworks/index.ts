import epa from './epa-qa-g5m.json' with { type: 'json' };
import type { Framework } from './framework.ts';
import trace from './trace.json' with { type: 'json' };

/** The one list of frameworks that a dossier is laid beside; a framework is a file here and a line in this list. */
export const frameworks: readonly Framework[] = [trace, epa];
