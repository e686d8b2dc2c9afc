import { type Document, visit, type YAMLError } from 'yaml';
import { type Fault, shortened } from './fault.ts';

interface Words {
  readonly message: string;
  readonly expected: string;
}

/** What a fault of YAML's syntax usually comes from, in plain words; for the rest the parser's own words serve. */
const words: Partial<Record<YAMLError['code'], Words>> = {
  BAD_INDENT: {
    message:
      'This line is not indented like the keys that it belongs to, or a bracket above it is not closed',
    expected: 'keys of one map in one column, and each bracket closed',
  },
  TAB_AS_INDENT: {
    message: 'This line is indented with a tab; YAML takes only blanks',
    expected: 'blanks',
  },
  BLOCK_AS_IMPLICIT_KEY: {
    message:
      'A second `: ` stands in this value, or the line below is indented too far; put a text that holds `: ` in quotes',
    expected: 'one key on a line, and quotes around a text that holds `: `',
  },
  MULTILINE_IMPLICIT_KEY: {
    message:
      'This is neither `key: value` nor a list entry; perhaps the colon, or the blank after it, is missing',
    expected: '`key: value`',
  },
  BAD_SCALAR_START: {
    message: 'A value can’t begin with this character unless it stands in quotes',
    expected: 'quotes around the value',
  },
};

const openQuote: Words = { message: 'This quote is not closed', expected: 'a quote at the end of the text' };

/** The faults of a document's syntax. Those at the very end of the text only follow from one before, if there is one. */
export function yamlFaults(document: Document.Parsed, text: string): Fault[] {
  const tab = document.errors.find(({ code }) => code === 'TAB_AS_INDENT');
  // What stands below a tab is misread because of it.
  const errors = document.errors.filter(
    ({ code, pos: [at] }) => tab === undefined || at < tab.pos[0] || code === 'TAB_AS_INDENT',
  );
  const faults = errors.map((error) => yamlFault(error, document, text));
  const end = text.trimEnd().length;
  const before = faults.filter(({ offset }) => offset < end);
  return before.length > 0 ? before : faults;
}

function yamlFault(error: YAMLError, document: Document.Parsed, text: string): Fault {
  const unclosed = error.message.includes('closing') ? quoteEndingAt(error.pos[0], document) : undefined;
  const offset = unclosed ?? error.pos[0];
  const known = unclosed === undefined ? words[error.code] : openQuote;
  const found = `\`${shortened(text.slice(offset).split(/\r?\n/, 1)[0]?.trim() ?? '')}\``;
  return {
    offset,
    field: [],
    message: `${known?.message ?? error.message}: ${found}.`,
    expected: known?.expected ?? 'text that follows the rules of YAML 1.2',
    found,
  };
}

/** Where the quoted text begins that runs on to a place. */
function quoteEndingAt(end: number, document: Document.Parsed): number | undefined {
  let start: number | undefined;
  visit(document, {
    Scalar(_, { range, type }) {
      if (range?.[1] === end && type?.startsWith('QUOTE')) start = range[0];
    },
  });
  return start;
}
