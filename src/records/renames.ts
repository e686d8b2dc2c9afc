/** Keys whose texts name records of an area without saying the area. */
const areaOfKey: Readonly<Record<string, string>> = { input: 'inputs.', on: 'inputs.', run: 'runs.' };

/** Paths and record ids that were renamed, for writing a statement the way it was before. */
export class Renames {
  readonly #paths: Map<string, string>;
  readonly #ids: Map<string, string>;

  constructor(paths: Iterable<[string, string]> = [], ids: Iterable<[string, string]> = []) {
    this.#paths = new Map(paths);
    this.#ids = new Map(ids);
  }

  /** How many names are known. */
  get size(): number {
    return this.#paths.size + this.#ids.size;
  }

  copy(): Renames {
    return new Renames(this.#paths, this.#ids);
  }

  /** A file that moved, both paths from the manifest's folder. What their ends share shows which folder was renamed. */
  addFile(from: string, to: string): void {
    const [old, now] = [from.split('/'), to.split('/')];
    while (old.length > 1 && now.length > 1 && old.at(-1) === now.at(-1)) {
      old.pop();
      now.pop();
    }
    this.#paths.set(now.join('/'), old.join('/'));
    this.#paths.set(to, from);
  }

  addRecord(from: string, to: string): void {
    this.#ids.set(to, from);
  }

  /** The id or field address now of what was called so before. */
  idNow(before: string): string {
    for (const [to, from] of this.#ids) {
      if (before === from || before.startsWith(`${from}.`)) return to + before.slice(from.length);
    }
    return before;
  }

  /** A statement with every renamed path, folder and record name as it was before. */
  asBefore(value: unknown, key = ''): unknown {
    if (typeof value === 'string') return this.#nameBefore(value, key) ?? this.#pathBefore(value);
    if (Array.isArray(value)) return value.map((one) => this.asBefore(one, key));
    if (typeof value !== 'object' || value === null) return value;
    return Object.fromEntries(
      Object.entries(value).map(([name, one]) => [
        key === 'bands' ? this.#idBefore(name, 'evaluation.') : name,
        this.asBefore(one, name),
      ]),
    );
  }

  #nameBefore(text: string, key: string): string | undefined {
    const area = areaOfKey[key];
    const whole = this.#ids.get(text);
    return whole ?? (area === undefined ? undefined : this.#idBefore(text, area));
  }

  #idBefore(name: string, area: string): string {
    return this.#ids.get(area + name)?.slice(area.length) ?? name;
  }

  #pathBefore(text: string): string {
    const whole = this.#paths.get(text);
    if (whole !== undefined) return whole;
    for (const [to, from] of this.#paths) if (text.startsWith(`${to}/`)) return from + text.slice(to.length);
    return text;
  }
}
