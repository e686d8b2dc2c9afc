// Makes the README's table of rules from the rules themselves; `npm run generate` writes it.
import { readFile, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { build } from 'esbuild';

const top = fileURLToPath(new URL('../../', import.meta.url));
const begin = '<!-- rules: begin (written by `npm run generate`) -->';
const end = '<!-- rules: end -->';

/** The README with its table as the rules are now. */
export async function readmeWithTable(readme) {
  const [start, stop] = [readme.indexOf(begin), readme.indexOf(end)];
  if (start < 0 || stop < start) throw new Error(`README.md lacks the lines ${begin} and ${end}.`);
  return `${readme.slice(0, start + begin.length)}\n${await table()}${readme.slice(stop)}`;
}

export async function writeReadme() {
  const path = join(top, 'README.md');
  await writeFile(path, await readmeWithTable(await readFile(path, 'utf8')));
}

/** Node 20 reads no TypeScript, so the list of rules is bundled into a module of text first. */
async function table() {
  const bundled = await build({
    stdin: {
      contents: "export { rules } from './index.ts'; export { levelInWords } from './level-in-words.ts';",
      resolveDir: join(top, 'src/rules'),
    },
    bundle: true,
    platform: 'node',
    format: 'esm',
    write: false,
    logLevel: 'warning',
  });
  const source = Buffer.from(bundled.outputFiles[0].contents).toString('base64');
  const { rules, levelInWords } = await import(`data:text/javascript;base64,${source}`);
  const rows = rules.map((rule) => `| \`${rule.id}\` | ${cell(rule.statement)} | ${levelInWords(rule)} |\n`);
  return `| rule | fires when | by default |\n|---|---|---|\n${rows.join('')}`;
}

function cell(text) {
  return text.replaceAll('|', '\\|');
}
