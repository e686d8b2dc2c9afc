import type { Chart } from '../charts/chart.ts';
import { escaped, shown } from '../charts/markup.ts';
import { type Block, type Page, type Piece, pieces, type Text } from './document.ts';
import { style } from './style.ts';

/** Nothing may be loaded, run or sent, whatever slipped in. */
const policy = "default-src 'none'; style-src 'unsafe-inline'; base-uri 'none'; form-action 'none'";

/** The page as one HTML file: its style and drawings inside, no script. */
export function toHtml({ title, draft, foot, blocks }: Page): string {
  const [opening, sections] = atFirstSection(blocks);
  const mark = draft ? '<div class="draft-mark" aria-hidden="true">DRAFT</div>\n' : '';
  return `<!DOCTYPE html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta http-equiv="Content-Security-Policy" content="${escaped(policy)}">
<meta name="viewport" content="width=device-width, initial-scale=1">
<meta name="color-scheme" content="light dark">
<title>${draft ? 'DRAFT: ' : ''}${escaped(title)}</title>
<style>${style(foot)}</style>
</head>
<body>
${mark}<header>
<h1>${escaped(title)}</h1>
${opening.map(blockHtml).join('\n')}
</header>
<nav aria-label="Contents"><ul>
${sections.flatMap(contentsEntry).join('\n')}
</ul></nav>
<main>
${inSections(sections)}
</main>
</body>
</html>
`;
}

function atFirstSection(blocks: readonly Block[]): readonly [readonly Block[], readonly Block[]] {
  const first = blocks.findIndex(({ kind }) => kind === 'heading');
  return first < 0 ? [blocks, []] : [blocks.slice(0, first), blocks.slice(first)];
}

function contentsEntry(block: Block): readonly string[] {
  return block.kind === 'heading' && block.level === 1
    ? [`<li><a href="#${escaped(block.id)}">${escaped(block.text)}</a></li>`]
    : [];
}

function inSections(blocks: readonly Block[]): string {
  let html = '';
  for (const block of blocks) {
    if (block.kind === 'heading' && block.level === 1)
      html += `${html === '' ? '' : '</section>\n'}<section aria-labelledby="${escaped(block.id)}">\n`;
    html += `${blockHtml(block)}\n`;
  }
  return html === '' ? '' : `${html}</section>`;
}

function blockHtml(block: Block): string {
  switch (block.kind) {
    case 'heading':
      return `<h${block.level + 1} id="${escaped(block.id)}">${escaped(block.text)}</h${block.level + 1}>`;
    case 'paragraph':
      return `<p${block.tone === undefined ? '' : ` class="${block.tone}"`}>${textHtml(block.text)}</p>`;
    case 'list':
      return `<ul>${block.items.map((item) => `<li>${textHtml(item)}</li>`).join('')}</ul>`;
    case 'facts':
      return `<dl>${block.entries.map(([name, text]) => `<div><dt>${escaped(name)}</dt><dd>${textHtml(text)}</dd></div>`).join('')}</dl>`;
    case 'table':
      return tableHtml(block);
    case 'figures':
      return `<div class="figures">\n${block.charts.map(figureHtml).join('\n')}\n</div>`;
    case 'commands':
      return `<pre>${block.lines.map((line) => `<code>${escaped(line)}</code>`).join('\n')}</pre>`;
  }
}

/** Roles are said outright, since narrow screens show rows as cards and browsers then forget that they are rows. */
function tableHtml({ caption, head, rows }: Extract<Block, { kind: 'table' }>): string {
  const heads = head.map((name) => `<th role="columnheader" scope="col">${escaped(name)}</th>`).join('');
  const body = rows.map((cells) => {
    const [first = '', ...more] = cells.map(textHtml);
    const under = more.map(
      (cell, place) => `<td role="cell" data-label="${escaped(head[place + 1] ?? '')}">${cell}</td>`,
    );
    return `<tr role="row"><th role="rowheader" scope="row">${first}</th>${under.join('')}</tr>`;
  });
  return `<table role="table"><caption>${escaped(caption)}</caption>
<thead role="rowgroup"><tr role="row">${heads}</tr></thead>
<tbody role="rowgroup">
${body.join('\n')}
</tbody></table>`;
}

function figureHtml({ title, summary, source, svg }: Chart): string {
  return `<figure><figcaption class="title">${escaped(title)}</figcaption>${svg}<p class="summary">${escaped(summary)}</p><p class="source">Source: ${escaped(source)}</p></figure>`;
}

function textHtml(text: Text): string {
  return pieces(text).map(pieceHtml).join('');
}

function pieceHtml(piece: Piece): string {
  if (typeof piece === 'string') return breakable(piece);
  if ('code' in piece) return `<code>${breakable(piece.code)}</code>`;
  if ('strong' in piece) return `<strong>${breakable(piece.strong)}</strong>`;
  return `${piece.svg}<span class="strip-text">${escaped(piece.text)}</span>`;
}

/** Very long words may be broken; dates, and figures parted by blanks, may not. */
function breakable(text: string): string {
  return shown(text)
    .split(/(\S{33,}|\b\d{4}-\d\d-\d\d\b)/)
    .map((part, place) => {
      if (place % 2 === 0) return escaped(part).replace(/(\d) (?=\d{3}(?!\d)|%)/g, '$1&nbsp;');
      if (part.length === 10) return `<time>${escaped(part)}</time>`;
      return (part.match(/.{1,16}/gsu) ?? []).map(escaped).join('<wbr>');
    })
    .join('');
}
