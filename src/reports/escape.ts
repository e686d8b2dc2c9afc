/** Characters that could move the cursor, colour the screen, reorder text or hide in it: controls, formatting, line ends, halves of a pair. */
const unsafe = /[\p{Cc}\p{Cf}\p{Zl}\p{Zp}\p{Cs}]/gu;

/** A stranger's text made safe for a terminal: unsafe characters appear as `\u{1b}`. */
export function plain(text: string): string {
  return text.replace(unsafe, (character) => `\\u{${(character.codePointAt(0) ?? 0).toString(16)}}`);
}

/** What CI hosts obey wherever it stands in a printed line: the first sign of `##[` and `##name[`. */
export const obeyedAnywhere = /#(?=#\w*\[)/g;

/**
 * Text in which no CI host finds a command, wherever it is printed: `::` where a line begins, after blanks too, appears as `\u{3a}:`,
 * and `##[` or `##name[` as `\u{23}#[`.
 */
export function inert(text: string): string {
  return text.replace(/((?:^|\u0085)[\s\u0085]*):(?=:)/gm, '$1\\u{3a}').replace(obeyedAnywhere, '\\u{23}');
}
