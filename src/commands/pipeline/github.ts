/** The commit to check, as it will be, and the program. */
const state = `      - uses: actions/checkout@v4
        with:
          fetch-depth: 0 # the base that a change is compared with lies in the history
          lfs: true # otherwise large files are pointers and their content can't be looked at
          persist-credentials: false
      - uses: actions/setup-node@v4
        with:
          node-version: '20'
`;

/** What Stoplog remembers of unchanged files, and where the newest of it is found. */
const memory = (version: string) => `        with:
          path: |
            .git/stoplog/digests
            .git/stoplog/values
          key: stoplog-${version}-\${{ github.run_id }}-\${{ github.run_attempt }}
          restore-keys: stoplog-${version}-
`;

/** A machine of one's own keeps its clone, and what an earlier job left there. */
const clearParts = `          rm -rf .git/stoplog/parts
`;

/** In a step with `BASE` from `base`: the words by which `check` compares, or none. */
const compared = `          # A first push has no base: git writes it as zeros, and the whole state is checked.
          case "$BASE" in *[!0]*) set -- --base "$BASE" ;; *) set -- ;; esac
`;
const base = `          BASE: \${{ github.base_ref && format('origin/{0}', github.base_ref) || github.event.before }}
`;

/** A job that does one part of the work in each run of its matrix. */
function partsJob(version: string, parts: number): string {
  const names = Array.from({ length: parts }, (_, place) => `${place + 1}of${parts}`);
  return `  parts:
    name: part \${{ matrix.part }} of the work
    runs-on: ubuntu-latest
    timeout-minutes: 60
    strategy:
      fail-fast: false
      matrix:
        part: [${names.join(', ')}]
    permissions:
      contents: read
    steps:
${state}      - uses: actions/cache/restore@v4
${memory(version)}      - name: Work
        env:
${base}          PART: \${{ matrix.part }}
        run: |
${clearParts}${compared}          npx --yes stoplog@${version} check --at HEAD "$@" --part "$PART"
          cp -R .git/stoplog/parts stoplog-part
      - uses: actions/upload-artifact@v4
        with:
          name: stoplog-part-\${{ matrix.part }}
          path: stoplog-part/
          retention-days: 1
`;
}

/** After the work in parts. */
const gathers = `    needs: parts
    # A job that is skipped, because another failed, would count as passed. This one runs, and does what is missing.
    if: \${{ !cancelled() }}
`;
const fetchParts = `      - uses: actions/download-artifact@v4
        with:
          pattern: stoplog-part-*
          merge-multiple: true
          path: stoplog-parts
`;
const placeParts = `${clearParts}          mkdir -p stoplog-parts .git/stoplog
          mv stoplog-parts .git/stoplog/parts
`;

/**
 * A workflow for GitHub Actions that checks what a pull request or a push changes, with a released version of Stoplog. With
 * more than one part the work is shared by as many machines.
 */
export function githubJob(version: string, parts = 1): string {
  const inParts = (text: string) => (parts > 1 ? text : '');
  return `# Written by \`stoplog pipeline github\`. Keep it as .github/workflows/stoplog.yml
#
# Permissions: the check itself may only read the repository. Annotations, the job's summary and the uploaded
# reports need nothing more. The job code-scanning alone may write, and only there: it runs nothing of the
# repository, and only in public repositories, where code scanning is always there. Take it out if you
# don't want it.
name: stoplog
on:
  pull_request:
  push:
    branches: [main, master]
permissions: {}
concurrency:
  group: stoplog-\${{ github.ref }}
  cancel-in-progress: \${{ github.event_name == 'pull_request' }}
jobs:
${inParts(partsJob(version, parts))}  records:
    name: records of the model
${inParts(gathers)}    runs-on: ubuntu-latest
    timeout-minutes: 30
    permissions:
      contents: read
    outputs:
      verdict: \${{ steps.check.outputs.verdict }}
    steps:
${state}      - name: What Stoplog remembers of unchanged files
        uses: actions/cache@v4
${memory(version)}${inParts(fetchParts)}      - name: Check
        id: check
        env:
${base}        run: |
          mkdir -p stoplog-reports
${inParts(placeParts)}${compared}          npx --yes stoplog@${version} check --at HEAD "$@" \\${inParts(`
            --gather \\`)}
            --report text --report github \\
            --report json=stoplog-reports/findings.json \\
            --report sarif=stoplog-reports/findings.sarif \\
            --report junit=stoplog-reports/findings.xml \\
            --report markdown=stoplog-reports/findings.md
      - name: Draft of the dossier
        if: \${{ !cancelled() && steps.check.outputs.verdict != '' }}
        run: npx --yes stoplog@${version} dossier --at HEAD --draft --out stoplog-reports/dossier-draft.zip
      - uses: actions/upload-artifact@v4
        if: \${{ !cancelled() }}
        with:
          name: stoplog-reports
          path: stoplog-reports/
          if-no-files-found: ignore
  code-scanning:
    needs: records
    if: \${{ !cancelled() && needs.records.outputs.verdict != '' && !github.event.repository.private && !github.event.pull_request.head.repo.fork }}
    runs-on: ubuntu-latest
    timeout-minutes: 10
    permissions:
      security-events: write
    steps:
      - uses: actions/download-artifact@v4
        with:
          name: stoplog-reports
          path: stoplog-reports
      - uses: github/codeql-action/upload-sarif@v4
        with:
          sarif_file: stoplog-reports/findings.sarif
          category: stoplog
`;
}
