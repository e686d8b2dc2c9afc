/** The hooks that `stoplog hook add` writes, as git names them: where people work, and where pushes arrive. */
export const hooksInClone = ['pre-commit', 'pre-merge-commit', 'pre-push'] as const;
export const hooksOnServer = ['pre-receive'] as const;
export const hookNames = [...hooksInClone, ...hooksOnServer] as const;
export type HookName = (typeof hookNames)[number];

const holdsBack: Record<HookName, string> = {
  'pre-commit': 'commit',
  'pre-merge-commit': 'merge',
  'pre-push': 'push',
  'pre-receive': 'push',
};

/** Where a project keeps a Stoplog of its own, from where git starts hooks: the top of the work tree, or a bare repository. */
export const bundleInProject = 'node_modules/stoplog/dist/stoplog.mjs';

/** Said where a Stoplog of the project's is left aside. */
export const notStarted =
  'node_modules/stoplog is not started, since git tracks node_modules: any branch could replace it.';

/**
 * What git tracks comes with a branch, a stranger's too. Any letter case counts, since some disks make no difference.
 * npm and husky put a folder in node_modules on PATH; where git tracks it, it is left out there too.
 */
const chooseInClone = `# What is checked must not bring along the program that checks it.
if [ -e node_modules ]; then
  tracked=$(git --icase-pathspecs ls-files -- node_modules) || exit
  if [ -n "$tracked" ]; then
    if [ -f ${bundleInProject} ]; then
      echo "${notStarted}" >&2
    fi
    rest=$PATH: path=
    while [ -n "$rest" ]; do
      case $rest in
        node_modules/* | "$PWD"/node_modules/* | "$(pwd -P)"/node_modules/*) ;;
        *) path=\${path:+$path:}\${rest%%:*} ;;
      esac
      rest=\${rest#*:}
    done
    PATH=$path
  elif [ -f ${bundleInProject} ]; then
    stoplog() { node ${bundleInProject} "$@"; }
  fi
fi
`;

/** Where pushes arrive no branch is checked out, and what lies there is the keeper's. */
const chooseOnServer = `if [ -f ${bundleInProject} ]; then
  stoplog() { node ${bundleInProject} "$@"; }
fi
`;

/** The bundle is started with node: going through npx takes ten times as long as a plain commit. */
const findStoplog = (hook: HookName) => `held() {
  echo "This ${holdsBack[hook]} is held back, since Stoplog could not check the records of the model." >&2
  printf '%s\\n' "$@" >&2
  exit 1
}
# No network is used, and reading certificates would slow the start.
unset NODE_EXTRA_CA_CERTS
${hook === 'pre-receive' ? chooseOnServer : chooseInClone}command -v node >/dev/null || held \\
  "Node.js was not found on PATH ($PATH)." \\
  "Install Node.js 20.19 or later. If it is installed and a graphical program runs git for you," \\
  "start that program from a terminal in which 'node --version' answers."
command -v stoplog >/dev/null || held \\
  "Stoplog was found neither in $PWD/node_modules nor on PATH." \\
  "Install it for yourself:                     npm install --global stoplog" \\
  "or, where the project has a package.json:    npm install --save-dev stoplog"
`;

const readPushed = `# What is pushed, one reference a line; kept because it can be read only once.
pushed=$(cat) || exit
tell_pushed() { if [ -n "$pushed" ]; then printf '%s\\n' "$pushed"; fi; }
`;

/** Of `LOCAL-REFERENCE LOCAL-ID REMOTE-REFERENCE REMOTE-ID` only the first may hold blanks: it is read from its end. */
const findCommits = `# The commits that are pushed, each once, tags followed to theirs; the zeros of a deletion name none.
commits=$(tell_pushed | while IFS= read -r line; do
  line=\${line% * *}
  git rev-parse --verify --quiet "\${line##* }^{commit}" 2>/dev/null || :
done | sort -u) || exit
if [ -z "$commits" ]; then exit 0; fi
`;

/**
 * Each line is `OLD-ID NEW-ID REFERENCE`, with zeros for a reference that is not there. What arrives is still apart from the
 * repository; the variables by which git finds it there reach every command. Tags are followed; a deletion, or what is no
 * commit, holds no records.
 */
const checkReceived = `# Each commit that arrives, and what it is held against: what its reference held; for a new
# reference, where it left the main branch. What was here already, such as a tagged commit, brings nothing.
commit_of() { git rev-parse --verify --quiet "$1^{commit}" 2>/dev/null; }
pairs=$(tell_pushed | while read -r old new _; do
  commit=$(commit_of "$new") || continue
  base=$(commit_of "$old" || git merge-base HEAD "$commit" 2>/dev/null || echo none)
  if [ "$commit" != "$base" ]; then echo "$commit $base"; fi
done | sort -u) || exit
if [ -z "$pairs" ]; then exit 0; fi
`;

const checkPairs = `echo "$pairs" | {
  status=0
  while read -r commit base; do
    set -- check --brief --if-touched --at "$commit"
    if [ "$base" != none ]; then set -- "$@" --base "$base"; fi
    stoplog "$@" </dev/null || status=1
  done
  exit $status; }
exit
`;

/**
 * `first` runs what comes before the check; it is given what to put in front of a command that reads the hook's input.
 * `base` is what a change is compared with where people work; null for the whole state.
 */
function script(hook: HookName, base: string | null, first: (input: string) => string): string {
  if (hook === 'pre-receive') {
    return readPushed + first('tell_pushed | ') + checkReceived + findStoplog(hook) + checkPairs;
  }
  const check = `stoplog check --brief --if-touched${base === null ? '' : ` --base '${base}'`}`;
  if (hook !== 'pre-push') return `${first('')}${findStoplog(hook)}${check} --at index\nexit\n`;
  const checks = `status=0\nfor commit in $commits; do ${check} --at "$commit" || status=1; done\nexit $status\n`;
  return readPushed + first('tell_pushed | ') + findCommits + findStoplog(hook) + checks;
}

/**
 * Our part of a hook that git starts itself. `earlier` names the hook that was there before, moved aside in the
 * same folder: it runs first, if executable (git skips others), with the same arguments and input.
 */
export function scriptForGit(hook: HookName, base: string | null, earlier: string | null): string {
  return script(hook, base, (input) =>
    earlier === null
      ? ''
      : `# The hook that was here before runs first; what it holds back stays held back.
earlier=\${0%/*}/${earlier}
if [ -x "$earlier" ]; then ${input}"$earlier" "$@" || exit; fi
`,
  );
}

/**
 * Our part of a hook that husky starts with `sh -e`. The lines below it run first, in a shell of their own: they
 * may stage files or end with `exit 0`, and the check still sees what will be committed.
 */
export function scriptForHusky(hook: HookName, base: string | null): string {
  const text = script(
    hook,
    base,
    (input) => `# The lines below this block run first; what they hold back stays held back.
${input}STOPLOG_BELOW=run sh -e "$0" "$@" || exit
`,
  );
  return `if [ "\${STOPLOG_BELOW-}" != run ]; then\n${text.replace(/^(?=.)/gm, '  ')}fi\nunset STOPLOG_BELOW\n`;
}
