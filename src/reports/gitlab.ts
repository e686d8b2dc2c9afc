import type { Verdict } from '../verdict/finding.ts';
import { plain } from './escape.ts';
import { everyFinding, explain, type Told, type Weight } from './explain.ts';
import { jsonText } from './json.ts';

/** GitLab documentation, "Code Quality": info, minor, major, critical, blocker. */
const severities: Readonly<Record<Weight, string>> = {
  block: 'critical',
  warn: 'minor',
  note: 'info',
  standing: 'minor',
  answered: 'info',
};

/** A GitLab code quality report. GitLab itself compares it with the target branch's. */
export function gitlabReport(verdict: Verdict): string {
  return jsonText(everyFinding(verdict).map(entry));
}

function entry({ finding, weight, identity }: Told) {
  return {
    description: `${plain(finding.record)}: ${explain(finding).join(' ')}`,
    check_name: finding.rule,
    fingerprint: identity,
    severity: severities[weight],
    location: { path: finding.file, lines: { begin: finding.line } },
  };
}
