/** A job for GitLab CI that checks what a merge request or a push changes, with a released version of Stoplog. */
export function gitlabJob(version: string): string {
  return `# Written by \`stoplog pipeline gitlab\`. Keep it as .gitlab-ci.yml, or in a file of its own that yours includes:
#   include: [{local: /.gitlab/stoplog.yml}]
#
# Permissions: the job needs no variable, secret or token beyond the one with which GitLab itself clones.
# The group or project may keep that token's reach at its own repository (Settings, CI/CD, Job token permissions).
stoplog:
  stage: test
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
      - .git/stoplog/
    when: always
  before_script:
    # The clone belongs to another user than this job's.
    - git config --global --add safe.directory "$CI_PROJECT_DIR"
    - mkdir -p stoplog-reports
  script:
    - |
      # A first push has no base: git writes it as zeros, and the whole state is checked.
      base="\${CI_MERGE_REQUEST_DIFF_BASE_SHA:-$CI_COMMIT_BEFORE_SHA}"
      case "$base" in *[!0]*) set -- --base "$base" ;; *) set -- ;; esac
      npx --yes stoplog@${version} check --at HEAD "$@" \\
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
