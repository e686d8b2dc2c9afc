import type { Intervention, Interventions } from '../../manifest/data.generated.ts';

/** The declared interventions; none where the record is absent or says that there are none. */
export function declared(interventions: Interventions): readonly Intervention[] {
  return Array.isArray(interventions) ? interventions : [];
}

/** How an intervention is called in messages. */
export function called({ kind, name }: Intervention): string {
  return [kind ?? 'intervention', name].filter((part) => part !== undefined).join(' ');
}
