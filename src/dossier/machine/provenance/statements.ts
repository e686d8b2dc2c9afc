/** A statement of PROV-JSON: attributes by qualified name. */
export type Statement = Readonly<Record<string, unknown>>;

export type Kind = 'entity' | 'activity' | 'agent';
export type Relation =
  | 'used'
  | 'wasGeneratedBy'
  | 'wasAssociatedWith'
  | 'wasAttributedTo'
  | 'wasDerivedFrom'
  | 'hadMember';

/** Gathers what is stated about provenance; each thing once, each relation under an ordinal. */
export class Statements {
  readonly #things: Record<Kind, Map<string, Statement>> = {
    entity: new Map(),
    activity: new Map(),
    agent: new Map(),
  };
  readonly #relations = new Map<Relation, Statement[]>();

  /** The identifier of a thing. What was said of it first stays. */
  add(kind: Kind, uuid: string, attributes: Statement): string {
    const id = `id:${uuid}`;
    if (!this.#things[kind].has(id)) this.#things[kind].set(id, attributes);
    return id;
  }

  relate(relation: Relation, attributes: Statement): void {
    const all = this.#relations.get(relation);
    if (all === undefined) this.#relations.set(relation, [attributes]);
    else all.push(attributes);
  }

  /** As PROV-JSON groups them. */
  grouped(): Readonly<Record<string, Readonly<Record<string, Statement>>>> {
    const things = Object.entries(this.#things).map(
      ([kind, map]) => [kind, Object.fromEntries(map)] as const,
    );
    let ordinal = 0;
    const relations = [...this.#relations].map(
      ([relation, all]) =>
        [relation, Object.fromEntries(all.map((one) => [`_:r${++ordinal}`, one]))] as const,
    );
    return Object.fromEntries([...things, ...relations]);
  }
}

/** A type of PROV or of our own. */
export function typed(name: string): object {
  return { $: name, type: 'prov:QUALIFIED_NAME' };
}

export function count(value: number): object {
  return { $: String(value), type: 'xsd:long' };
}

export function day(date: string): object {
  return { $: date, type: 'xsd:date' };
}
