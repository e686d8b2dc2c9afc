import type { YAMLError } from 'yaml';
import { type Fault, quoted } from './fault.ts';

/** What a fault of YAML's syntax usually comes from, in plain words; for the rest the parser's own words serve. */
const words: Partial<Record<YAMLError['code'], { message: string; expected: string }>> = {
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

export function yamlFault(error: YAMLError, text: string): Fault {
  const [offset] = error.pos;
  const known = words[error.code];
  const found = quoted(text.slice(offset).split(/\r?\n/, 1)[0] ?? '');
  return {
    offset,
    field: [],
    message: `${known?.message ?? error.message}: ${found}.`,
    expected: known?.expected ?? 'text that follows the rules of YAML 1.2',
    found,
  };
}
