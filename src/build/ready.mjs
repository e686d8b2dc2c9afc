// Makes a fresh clone ready: installs what package-lock.json names, generates, bundles. Each step is skipped
// when what it would make is newer than what it is made from; `--again` makes everything but the install anew.
import { spawnSync } from 'node:child_process';
import { existsSync, readdirSync, statSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';

const top = fileURLToPath(new URL('../../', import.meta.url));
const again = process.argv.includes('--again');

const [major = 0, minor = 0] = process.versions.node.split('.').map(Number);
if (major < 20 || (major === 20 && minor < 19)) {
  console.error(`Stoplog needs Node 20.19 or newer; this is ${process.version}.`);
  process.exit(2);
}

const installed = join(top, 'node_modules', '.package-lock.json');
if (changedAt(installed) < changedAt(join(top, 'package-lock.json'))) install();

const made = ['src/manifest/validate-manifest.generated.js', 'dist/stoplog.mjs', 'dist/index.mjs'];
const madeAt = Math.min(...made.map((path) => changedAt(join(top, path))));
const sources = ['src', 'schemas', 'package.json'].map((path) => newest(join(top, path)));
if (again || madeAt < Math.max(...sources, changedAt(installed))) {
  const { writeGenerated } = await import('./generate.mjs');
  await writeGenerated();
  const { bundle } = await import('./bundle.mjs');
  await bundle(top);
}

function install() {
  const npm = process.env.npm_execpath;
  console.error('Installing what Stoplog is built with (once) ...');
  const [command, first] = npm?.endsWith('js') ? [process.execPath, [npm]] : ['npm', []];
  const done = spawnSync(command, [...first, 'ci', '--no-audit', '--no-fund', '--loglevel=error'], {
    cwd: top,
    stdio: ['ignore', 2, 2],
    shell: command === 'npm' && process.platform === 'win32',
  });
  if (done.status !== 0) {
    console.error('npm could not install the packages; its own words are above.');
    process.exit(2);
  }
}

function changedAt(path) {
  return existsSync(path) ? statSync(path).mtimeMs : 0;
}

function newest(path) {
  if (!statSync(path).isDirectory()) return changedAt(path);
  const inside = readdirSync(path, { withFileTypes: true }).filter(
    (entry) => !entry.name.includes('.generated.'),
  );
  return Math.max(0, ...inside.map((entry) => newest(join(path, entry.name))));
}
