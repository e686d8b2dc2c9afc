/**
 * Why a run could not be carried out at all: exit status 2. Faults in what a user keeps in the repository
 * are findings and never come this way. DEVELOPERS.md lists each code; a test compares the two lists.
 */
export const failureCodes = [
  'usage', // the command line asks for something that does not exist
  'no-git', // git is not installed or could not be started
  'no-repository', // the folder is in no git repository
  'no-manifest', // no stoplog.yaml in the snapshot
  'unknown-revision', // a revision that git can't resolve
  'git-failed', // git refused; its own words are in the message
  'unreadable-file', // the disk refused a file that we had to read
  'unwritable-file', // the disk refused a file that we had to write
  'no-identity', // git knows no name and email, so a seal can't say who reviewed
  'cannot-seal', // a record that was asked for can't be sealed as it stands
  'internal', // a fault of Stoplog's own
] as const;

export type FailureCode = (typeof failureCodes)[number];

export class Failure extends Error {
  readonly code: FailureCode;
  /** What the reader can do next, in a sentence; printed after the message. */
  readonly next: string;

  constructor(code: FailureCode, message: string, next: string, cause?: unknown) {
    super(message, cause === undefined ? undefined : { cause });
    this.name = 'Failure';
    this.code = code;
    this.next = next;
  }
}
