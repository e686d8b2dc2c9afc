/** What the outside world gives a command, and where its words go. Only main.ts makes a real one. */
export interface Context {
  readonly cwd: string;
  readonly environment: Readonly<Record<string, string | undefined>>;
  /** ISO 8601 date by which waivers expire and seals are dated. */
  readonly today: string;
  /** Whether standard output is a terminal that shows colours. */
  readonly color: boolean;
  /** Standard output: what was asked for. `command` where a CI host is meant to obey it. */
  write(text: string, may?: 'command'): void;
  /** Standard error: what goes beside it. */
  tell(text: string): void;
  /** Says how far long work has come, on a terminal only; each takes the place of the one before. */
  progress(text: string): void;
}

/** 0 pass, 1 blocked, 2 could not check (thrown as a Failure). */
export type ExitStatus = 0 | 1;
