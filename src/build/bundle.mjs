// Bundles the command and the library. The command starts from one file: loading many modules costs three times bare Node.
import { chmodSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { build } from 'esbuild';

export async function bundle(top) {
  const { version } = JSON.parse(readFileSync(join(top, 'package.json'), 'utf8'));
  const common = {
    absWorkingDir: top,
    bundle: true,
    platform: 'node',
    format: 'esm',
    target: 'node20.19',
    legalComments: 'none',
    metafile: true,
    logLevel: 'warning',
    define: { STOPLOG_VERSION: JSON.stringify(version) },
  };
  const needsRequire =
    "import { createRequire } from 'node:module'; const require = createRequire(import.meta.url);";
  const [command, library] = await Promise.all([
    build({
      ...common,
      entryPoints: ['src/main.ts'],
      outfile: 'dist/stoplog.mjs',
      banner: { js: `#!/usr/bin/env node\n${needsRequire}` },
    }),
    build({
      ...common,
      entryPoints: ['src/index.ts'],
      outfile: 'dist/index.mjs',
      banner: { js: needsRequire },
    }),
  ]);
  chmodSync(join(top, 'dist/stoplog.mjs'), 0o755);
  writeLicences(top, [command.metafile, library.metafile]);
}

/** The licences of the libraries inside the bundles, as most of them ask for. */
function writeLicences(top, metafiles) {
  const packages = new Set();
  for (const path of metafiles.flatMap((metafile) => Object.keys(metafile.inputs))) {
    const name = /^node_modules\/((?:@[^/]+\/)?[^/]+)\//.exec(path)?.[1];
    if (name) packages.add(name);
  }
  const texts = [...packages].sort().map((name) => {
    const folder = join(top, 'node_modules', name);
    const { version, license } = JSON.parse(readFileSync(join(folder, 'package.json'), 'utf8'));
    return `${name} ${version} (${license})\n\n${licenceText(folder)}\n`;
  });
  const file = join(top, 'dist', 'THIRD-PARTY-LICENCES.txt');
  rmSync(file, { force: true });
  writeFileSync(file, texts.join(`\n${'-'.repeat(72)}\n\n`));
}

function licenceText(folder) {
  for (const name of ['LICENSE', 'LICENSE.md', 'LICENSE.txt', 'LICENCE', 'license', 'LICENSE-MIT']) {
    try {
      return readFileSync(join(folder, name), 'utf8').trim();
    } catch {
      // The next usual name.
    }
  }
  return 'The package carries no licence text of its own.';
}
