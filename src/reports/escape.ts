/** Characters that could move the cursor, colour the screen or reorder text: C0 and C1 controls, the bidirectional ones, and halves of a pair. */
// biome-ignore lint/suspicious/noControlCharactersInRegex: these are what is looked for.
const unsafe = /[\u0000-\u001f\u007f-\u009f\u200e\u200f\u2028-\u202e\u2066-\u2069\p{Surrogate}]/gu;

/** A stranger's text made safe for a terminal: unsafe characters appear as `\u{1b}`. */
export function plain(text: string): string {
  return text.replace(unsafe, (character) => `\\u{${(character.codePointAt(0) ?? 0).toString(16)}}`);
}
