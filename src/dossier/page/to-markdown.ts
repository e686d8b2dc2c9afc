import { shown } from '../charts/markup.ts';
import { type Block, type Page, type Piece, pieces, type Text } from './document.ts';

/** The same page as Markdown (CommonMark, with tables as GitHub writes them); figures by what they say. */
export function toMarkdown({ title, draft, blocks }: Page): string {
  const parts = [`# ${draft ? 'DRAFT: ' : ''}${inText(title).trim()}`, ...blocks.map(blockText)];
  if (draft) parts.push('**DRAFT: not for archiving.**');
  return `${parts.join('\n\n')}\n`;
}

function blockText(block: Block): string {
  switch (block.kind) {
    case 'heading':
      return `${'#'.repeat(block.level + 1)} ${inText(block.text)}`;
    case 'paragraph':
      return block.tone === undefined
        ? beginning(lineText(block.text))
        : `> ${beginning(lineText(block.text))}`;
    case 'list':
      return block.items.map((item) => `- ${beginning(lineText(item))}`).join('\n');
    case 'facts':
      return block.entries.map(([name, text]) => `- **${inText(name)}:** ${lineText(text)}`).join('\n');
    case 'table':
      return [
        `**${inText(block.caption)}**\n`,
        row(block.head.map(inText)),
        row(block.head.map(() => '---')),
        ...block.rows.map((cells) => row(cells.map(lineText))),
      ].join('\n');
    case 'figures':
      return block.charts
        .map(
          ({ title, summary, source }) =>
            `**Figure: ${inText(title)}.** ${inText(summary)} Source: ${inText(source)}`,
        )
        .join('\n\n');
    case 'commands':
      return block.lines.map((line) => `    ${shown(line)}`).join('\n');
  }
}

function row(cells: readonly string[]): string {
  return `| ${cells.join(' | ')} |`;
}

function lineText(text: Text): string {
  return pieces(text).map(pieceText).join('').trim();
}

/** At the beginning of a line some more characters are markup: of lists, and of lines below headings. */
function beginning(line: string): string {
  return line.replace(/^[-+=:]/, '\\$&').replace(/^(\d+)([.)])/, '$1\\$2');
}

function pieceText(piece: Piece): string {
  if (typeof piece === 'string') return inText(piece);
  if ('code' in piece) return isPlain.test(piece.code) ? `\`${piece.code}\`` : inText(piece.code);
  if ('strong' in piece) return `**${inText(piece.strong)}**`;
  return inText(piece.text);
}

/** A name, path, digest or figure that can do nothing in a code span. */
const isPlain = /^[\w./:=+,-]+$/;

/**
 * A stranger's text as text: everything that begins markup, a link, a reference or an entity is escaped. Code spans are not
 * used for it, because no escape works inside them.
 */
export function inText(text: string): string {
  return shown(text)
    .replace(/[\\`*_[\]#|~@$]/g, '\\$&')
    .replaceAll('&', '&amp;')
    .replaceAll('<', '&lt;')
    .replaceAll('>', '&gt;')
    .replaceAll('://', ':\\/\\/')
    .replace(/\bwww\./gi, '$&\u2060');
}
