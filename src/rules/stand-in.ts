const standIns: ReadonlySet<string> = new Set([
  'unknown',
  'not known',
  'n/a',
  'tba',
  'tbc',
  'xx',
  'placeholder',
  'as usual',
  'as always',
  'see above',
  'to be done',
  'to be decided',
  'to be determined',
]);

/** Whether a text says nothing: it has no letter or digit, is a word such as `unknown`, or begins with `todo`, `tbd`, `fixme` or `xxx`. */
export function isStandIn(text: string): boolean {
  const bare = text.toLowerCase().replace(/^[^\p{L}\p{N}]+|[^\p{L}\p{N}]+$/gu, '');
  return bare === '' || standIns.has(bare) || /^(?:to[- ]?do|tbd|fixme|xxx+)\b/.test(bare);
}

/** Whether a text is there and says something. */
export function isStated(text: string | undefined): text is string {
  return text !== undefined && !isStandIn(text);
}
