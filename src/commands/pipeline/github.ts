/** A workflow for GitHub Actions that checks what a pull request or a push changes, with a released version of Stoplog. */
export function githubJob(version: string): string {
  return `# Written by \`stoplog pipeline github\`. Keep it as .github/workflows/stoplog.yml
#
# Permissions: the check itself may only read the repository. Annotations, the job's summary and the uploaded
# reports need nothing more. The second job alone may write, and only to code scanning: it runs nothing of the
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
  records:
    name: records of the model
    runs-on: ubuntu-latest
    timeout-minutes: 30
    permissions:
      contents: read
    steps:
      - uses: actions/checkout@v4
        with:
          fetch-depth: 0 # the base that a change is compared with lies in the history
          lfs: true # otherwise large files are pointers and their content can't be looked at
          persist-credentials: false
      - uses: actions/setup-node@v4
        with:
          node-version: '20'
      - name: What Stoplog remembers of unchanged files
        uses: actions/cache@v4
        with:
          path: .git/stoplog
          key: stoplog-${version}-\${{ github.run_id }}-\${{ github.run_attempt }}
          restore-keys: stoplog-${version}-
      - name: Check
        id: check
        env:
          BASE: \${{ github.event.pull_request.base.sha || github.event.before }}
        run: |
          mkdir -p stoplog-reports
          # A first push has no base: git writes it as zeros, and the whole state is checked.
          case "$BASE" in *[!0]*) set -- --base "$BASE" ;; *) set -- ;; esac
          npx --yes stoplog@${version} check --at HEAD "$@" \\
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
    if: \${{ !cancelled() && !github.event.repository.private && !github.event.pull_request.head.repo.fork }}
    runs-on: ubuntu-latest
    timeout-minutes: 10
    permissions:
      security-events: write
    steps:
      - uses: actions/download-artifact@v4
        with:
          name: stoplog-reports
          path: stoplog-reports
      - uses: github/codeql-action/upload-sarif@v3
        with:
          sarif_file: stoplog-reports/findings.sarif
          category: stoplog
`;
}
