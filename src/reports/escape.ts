/** Characters that could move the cursor, colour the screen, reorder text or hide in it: controls, formatting, line ends, halves of a pair. */
const unsafe = /[\p{Cc}\p{Cf}\p{Zl}\p{Zp}\p{Cs}]/gu;

/** A stranger's text made safe for a terminal: unsafe characters appear as `\u{1b}`. */
export function plain(text: string): string {
  return text.replace(unsafe, (character) => `\\u{${(character.codePointAt(0) ?? 0).toString(16)}}`);
}
