import { Composer, type CST, type Document, isMap, Lexer, LineCounter, Parser, type YAMLMap } from 'yaml';
import type { Fault } from './fault.ts';
import { yamlFaults } from './yaml-fault.ts';

// Far above what people write, and far below what does harm.
const longestText = 2 * 1024 * 1024;
const deepestNesting = 64;

export interface YamlText {
  /** The map that the text holds; null where it holds none, and the faults say why. */
  readonly root: YAMLMap | null;
  /** Where YAML could go on past a fault, later faults and the rest of the map are here too. */
  readonly faults: readonly Fault[];
  readonly lines: LineCounter;
}

/** Reads one YAML 1.2 document (core schema: dates stay texts) that holds a map. */
export function parseYaml(text: string): YamlText {
  const lines = new LineCounter();
  for (let start = 0; start !== -1; start = text.indexOf('\n', start) + 1 || -1) lines.addNewLine(start);

  const unfit = unfitText(text);
  if (unfit.length > 0) return { root: null, faults: unfit, lines };
  const { tokens, tooDeepAt } = tokensOf(text);
  if (tooDeepAt !== null) return { root: null, faults: [tooDeep(tooDeepAt)], lines };

  // Duplicate keys are found where the tree is turned into data: both places are known there.
  const composer = new Composer({ schema: 'core', uniqueKeys: false, prettyErrors: false });
  const [document, second] = [...composer.compose(tokens, true, text.length)];
  const faults = document === undefined ? [] : yamlFaults(document, text);
  if (second !== undefined) faults.push(secondDocument(second));
  const root = isMap(document?.contents) ? document.contents : null;
  if (root === null) faults.push(noMap(document));
  return { root, faults, lines };
}

function unfitText(text: string): readonly Fault[] {
  const notText = text.search(/[\0\uFFFD]/);
  if (notText !== -1) {
    return [
      {
        offset: notText,
        field: [],
        message: 'The file is not UTF-8 text, so nothing in it can be read; save it as UTF-8.',
        expected: 'UTF-8 text',
        found: 'bytes of another encoding',
      },
    ];
  }
  if (text.length > longestText) {
    return [
      {
        offset: 0,
        field: [],
        message:
          'The manifest is too long to be read at each commit; move long lists into table files (`table`, `each`).',
        expected: `at most ${longestText} characters`,
        found: `${text.length} characters`,
      },
    ];
  }
  return [...text.matchAll(/^(?:<{7}|>{7})(?: .*)?$/gm)].map((marker) => ({
    offset: marker.index,
    field: [],
    message: 'A merge conflict was left here; keep what is true of both sides and take the marker out.',
    expected: 'no conflict markers',
    found: marker[0],
  }));
}

function tokensOf(text: string): { tokens: CST.Token[]; tooDeepAt: number | null } {
  const tokens: CST.Token[] = [];
  const parser = new Parser();
  for (const lexeme of new Lexer().lex(text)) {
    tokens.push(...parser.next(lexeme));
    if (parser.stack.length > deepestNesting) return { tokens, tooDeepAt: parser.offset };
  }
  return { tokens: [...tokens, ...parser.end()], tooDeepAt: null };
}

function tooDeep(offset: number): Fault {
  return {
    offset,
    field: [],
    message: 'Lists and maps stand too deeply in each other here; no key of a manifest needs that.',
    expected: `at most ${deepestNesting} levels`,
    found: 'more',
  };
}

function secondDocument(document: Document.Parsed): Fault {
  return {
    offset: document.range[0],
    field: [],
    message:
      'A second YAML document begins after `---`; a manifest is one document, and each model has a file of its own.',
    expected: 'one document',
    found: 'a second one',
  };
}

function noMap(document: Document.Parsed | undefined): Fault {
  const empty = document?.contents === null || document === undefined;
  return {
    offset: document?.contents?.range?.[0] ?? 0,
    field: [],
    message: `The manifest ${empty ? 'is empty' : 'is no map of keys'}; begin with the line \`stoplog: 1\` and a \`study\`.`,
    expected: 'a map of keys such as `stoplog: 1`',
    found: empty ? 'nothing' : 'something else',
  };
}
