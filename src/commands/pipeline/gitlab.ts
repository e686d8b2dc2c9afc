/** What every job needs to see the commit to check, as it will be. */
const state = (version: string, policy: 'pull' | 'pull-push') => `  stage: test
  image: node:20-bookworm
  timeout: 30 minutes
  interruptible: true
  rules:
    - if: $CI_PIPELINE_SOURCE == "merge_request_event"
    - if: $CI_COMMIT_BRANCH == $CI_DEFAULT_BRANCH
  variables:
    GIT_DEPTH: "0" # the base that a change is compared with lies in the history
    GIT_LFS_SKIP_SMUDGE: "0" # otherwise large files are pointers and their content can't be looked at
  cache: # what Stoplog remembers of unchanged files
    key: stoplog-${version}
    paths:
      - .git/stoplog/digests
      - .git/stoplog/values
    policy: ${policy}
    when: always
`;

const safe = `    # The clone belongs to another user than this job's.
    - git config --global --add safe.directory "$CI_PROJECT_DIR"
`;

/** A runner may keep its clone, and what an earlier job left there. */
const clearParts = `    - rm -rf .git/stoplog/parts
`;

/** The words by which `check` compares, or none. */
const compared = `      # Where GitLab merges before it checks, the base is what it merged with. A first push has none: git writes it as
      # zeros, and the whole state is checked.
      base="\${CI_MERGE_REQUEST_TARGET_BRANCH_SHA:-\${CI_MERGE_REQUEST_DIFF_BASE_SHA:-$CI_COMMIT_BEFORE_SHA}}"
      case "$base" in *[!0]*) set -- --base "$base" ;; *) set -- ;; esac
`;

/** A job that does one part of the work on each of several machines. */
function partsJob(version: string, parts: number): string {
  return `stoplog-parts:
${state(version, 'pull')}  parallel: ${parts}
  before_script:
${safe}${clearParts}  script:
    - |
${compared}      npx --yes stoplog@${version} check --at HEAD "$@" --part "\${CI_NODE_INDEX}of\${CI_NODE_TOTAL}"
    - cp -R .git/stoplog/parts stoplog-parts
  artifacts:
    expire_in: 1 day
    paths:
      - stoplog-parts/
`;
}

/** The one that comes after them. */
const gathers = `  needs: [stoplog-parts]
`;
const placeParts = `${clearParts}    - mkdir -p .git/stoplog
    - mv stoplog-parts .git/stoplog/parts
`;

/**
 * A job for GitLab CI that checks what a merge request or a push changes, with a released version of Stoplog. With more than
 * one part the work is shared by as many machines.
 */
export function gitlabJob(version: string, parts = 1): string {
  const inParts = (text: string) => (parts > 1 ? text : '');
  return `# Written by \`stoplog pipeline gitlab\`. Keep it as .gitlab-ci.yml, or in a file of its own that yours includes:
#   include: [{local: /.gitlab/stoplog.yml}]
#
# Permissions: the job needs no variable, secret or token beyond the one with which GitLab itself clones.
# The group or project may keep that token's reach at its own repository (Settings, CI/CD, Job token permissions).
${inParts(partsJob(version, parts))}stoplog:
${state(version, 'pull-push')}${inParts(gathers)}  before_script:
${safe}    - mkdir -p stoplog-reports
${inParts(placeParts)}  script:
    - |
${compared}      npx --yes stoplog@${version} check --at HEAD "$@" \\${inParts(`
        --gather \\`)}
        --report text \\
        --report json=stoplog-reports/findings.json \\
        --report gitlab=stoplog-reports/code-quality.json \\
        --report junit=stoplog-reports/findings.xml \\
        --report markdown=stoplog-reports/findings.md
  after_script:
    - npx --yes stoplog@${version} dossier --at HEAD --draft --out stoplog-reports/dossier-draft.zip
  artifacts:
    name: stoplog-$CI_COMMIT_SHORT_SHA
    when: always
    expire_in: 90 days
    paths:
      - stoplog-reports/
    reports:
      codequality: stoplog-reports/code-quality.json
      junit: stoplog-reports/findings.xml
`;
}
