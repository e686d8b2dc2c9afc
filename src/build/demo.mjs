// The main job, played on a copy of the example: a sound commit passes, one changed rain value is held back,
// and after restoring it the commit passes again. Everything happens in a temporary folder, which is removed.
import { spawnSync } from 'node:child_process';
import { cpSync, mkdirSync, mkdtempSync, readFileSync, rmSync, symlinkSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { delimiter, join } from 'node:path';
import { fileURLToPath } from 'node:url';

const top = fileURLToPath(new URL('../../', import.meta.url));
const work = mkdtempSync(join(tmpdir(), 'stoplog-demo-'));
const repository = join(work, 'fennock-water');
const tools = join(work, 'bin');
const rainFile = 'data/rain/high-tarrow.csv';

try {
  mkdirSync(tools);
  symlinkSync(join(top, 'dist/stoplog.mjs'), join(tools, 'stoplog'));
  cpSync(join(top, 'example-project'), repository, { recursive: true });
  say('A catchment model in git: the invented Fennock Water, with its records sealed.');
  git('init', '--quiet', '--initial-branch=main');
  git('config', 'user.name', 'Demo Hydrologist');
  git('config', 'user.email', 'demo@northmere.example');
  git('config', 'core.autocrlf', 'false');
  show('stoplog hook add', 0);

  say('1. Everything is as it was reviewed. The commit passes.');
  git('add', '--all');
  show('git commit --quiet -m "Fennock Water, calibrated"', 0);

  say(`2. Somebody changes one rain value in ${rainFile} and commits.`);
  const sound = readFileSync(join(repository, rainFile), 'utf8');
  writeFileSync(join(repository, rainFile), changeOneValue(sound));
  show(`git diff --unified=0 ${rainFile}`, 0);
  show(`git commit --quiet -m "Correct the gauge" ${rainFile}`, 1);

  say('3. The value is put back, and work goes on. The commit passes.');
  writeFileSync(join(repository, rainFile), sound);
  writeFileSync(join(repository, 'notes.txt'), 'Gauge visited; the old value stands.\n');
  git('add', '--all');
  show('git commit --quiet -m "Note the gauge visit"', 0);
  show('git log --oneline', 0);
  say('That is the main job. Next: README.md, or `node dist/stoplog.mjs --help`.');
} finally {
  rmSync(work, { recursive: true, force: true });
}

function say(text) {
  console.log(`\n== ${text}`);
}

/** Runs a command line as a user would and shows it; another exit status than expected ends the demo as failed. */
function show(line, expected) {
  console.log(`\n$ ${line}`);
  const { status } = run('sh', ['-c', line], 'inherit');
  if ((status === 0) !== (expected === 0)) {
    console.error(
      `The demo expected ${expected === 0 ? 'success' : 'a refusal'}, but got exit status ${status}.`,
    );
    process.exitCode = 1;
    throw new Error('The demo did not go as it should.');
  }
  if (status !== 0) console.log(`(exit status ${status}: no commit was made)`);
}

function git(...args) {
  const { status, stderr } = run('git', args, 'pipe');
  if (status !== 0) throw new Error(`git ${args.join(' ')}: ${stderr}`);
}

function run(command, args, stdio) {
  const own = Object.entries(process.env).filter(([name]) => !/^(GIT_|npm_)/.test(name));
  const env = {
    ...Object.fromEntries(own),
    GIT_CONFIG_GLOBAL: '/dev/null',
    GIT_CONFIG_NOSYSTEM: '1',
    GIT_PAGER: 'cat',
  };
  env.PATH = `${tools}${delimiter}${process.env.PATH}`;
  return spawnSync(command, args, { cwd: repository, env, stdio, encoding: 'utf8' });
}

/** The first wet day of the file's second half gains 25 mm. */
function changeOneValue(text) {
  const lines = text.split('\n');
  const column = lines[0].split(',').indexOf('rain_mm');
  const place = lines.findIndex(
    (line, index) => index > lines.length / 2 && Number(line.split(',')[column]) > 1,
  );
  const cells = lines[place].split(',');
  cells[column] = (Number(cells[column]) + 25).toFixed(1);
  lines[place] = cells.join(',');
  return lines.join('\n');
}
