import { plain } from '../../reports/escape.ts';

/**
 * A stranger's text made safe for HTML and SVG, in content and in quoted attributes. Line ends become blanks; other
 * control characters, and those that reorder text, appear as `\u{1b}`.
 */
export function escaped(text: string): string {
  return shown(text)
    .replaceAll('&', '&amp;')
    .replaceAll('<', '&lt;')
    .replaceAll('>', '&gt;')
    .replaceAll('"', '&quot;')
    .replaceAll("'", '&#39;');
}

/** The text as every document shows it, before the escapes of its own format. */
export function shown(text: string): string {
  return plain(text.replace(/[\t ]*\r?\n[\t ]*|\t/g, ' ').replace(/\p{Surrogate}/gu, '\ufffd'));
}

/** At most so many characters; the rest is told by `…`. */
export function shortened(text: string, most: number): string {
  const characters = [...shown(text)];
  return characters.length <= most ? characters.join('') : `${characters.slice(0, most - 1).join('')}…`;
}

export type Attributes = Readonly<Record<string, string | number>>;

/** One element of SVG or HTML; `content` is markup already. Numbers keep one decimal, which is finer than any screen draws. */
export function element(name: string, attributes: Attributes, content = ''): string {
  const written = Object.entries(attributes)
    .map(([key, value]) => ` ${key}="${typeof value === 'number' ? short(value) : escaped(value)}"`)
    .join('');
  return content === '' ? `<${name}${written}/>` : `<${name}${written}>${content}</${name}>`;
}

/** A text of a drawing. */
export function label(x: number, y: number, text: string, attributes: Attributes = {}): string {
  return element('text', { x, y, ...attributes }, escaped(text));
}

/** A coordinate: one decimal, none where it is whole. */
export function short(value: number): string {
  const rounded = Math.round(value * 10) / 10;
  return String(rounded === 0 ? 0 : rounded);
}
