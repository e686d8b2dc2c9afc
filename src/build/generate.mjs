// Makes from the schemas what is not written by hand: the manifest's types, its validators, and the notes on its
// keys that messages and seals need. `node src/build/generate.mjs` writes them all.
import { hash } from 'node:crypto';
import { readFile, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { _ } from 'ajv';
import { Ajv2020 } from 'ajv/dist/2020.js';
import standalone from 'ajv/dist/standalone/index.js';
import { build } from 'esbuild';
import { compile } from 'json-schema-to-typescript';
import { writeReadme } from './readme-table.mjs';

const top = fileURLToPath(new URL('../../', import.meta.url));
const manifestFolder = join(top, 'src/manifest');
const banner = '// Made from schemas/manifest.schema.json by src/build/generate.mjs; do not edit.';

/** Every generated file: path from the top of the repository -> content. */
export async function generate() {
  const schema = writtenOut(JSON.parse(await readFile(join(top, 'schemas/manifest.schema.json'), 'utf8')));
  const branches = branchNames(schema);
  return new Map([
    ['src/manifest/data.generated.ts', await types(schema)],
    ['src/manifest/kinds.generated.ts', notes(schema)],
    ['src/manifest/validate-manifest.generated.d.ts', validatorTypes(schema, branches)],
    ['src/manifest/validate-manifest.generated.js', await validators(schema, branches)],
  ]);
}

export async function writeGenerated() {
  for (const [path, content] of await generate()) await writeFile(join(top, path), content);
}

/** A named type for each entry of `$defs`; a `$ref` becomes that name, so that none is made twice. */
async function types(schema) {
  const typed = (node) => {
    if (Array.isArray(node)) return node.map(typed);
    if (node === null || typeof node !== 'object') return node;
    const { $ref, propertyNames, ...rest } = mapValues(node, typed);
    if (typeof rest.description === 'string') rest.description = told(node);
    return $ref === undefined ? rest : { ...rest, tsType: defName($ref) };
  };
  const text = await compile(typed(schema), schema.title, {
    additionalProperties: false,
    bannerComment: banner,
    unreachableDefinitions: true,
    format: false, // formatting takes ten times as long as all the rest
  });
  return indented(
    text.replace(/ \* ?\n \* This interface was referenced by .*\n \* via the `definition` .*\n/g, ''),
  );
}

function told({ description, 'x-unit': unit, 'x-source': source }) {
  return [description, unit && `Unit: ${unit}.`, source && `Source: ${source}.`].filter(Boolean).join(' ');
}

function indented(text) {
  let depth = 0;
  return text.replace(/^(?! ?\*)(.+)$|^( ?\*.*)$/gm, (line, code) => {
    if (code?.startsWith('}')) depth -= 1;
    const out = '  '.repeat(depth) + line;
    if (code?.endsWith('{')) depth += 1;
    return out;
  });
}

/** Which keys are prose or acceptances, for seals. */
function notes(schema) {
  return `${banner}
/** Kind of fragment -> the kind of its keys, of its list entries (\`[]\`) and of its named entries (\`*\`), where they are \`prose\` or \`accepts\` or hold such. */
export const kinds: Readonly<Record<string, Readonly<Record<string, string>>>> = ${JSON.stringify(kindsOf(schema), null, 2)};

/** Tells one version of the schema from another. */
export const schemaDigest = '${hash('sha256', JSON.stringify(schema)).slice(0, 16)}';
`;
}

/** Which keys are prose or acceptances, by kind of fragment: a definition, or a place inside one. */
function kindsOf(schema) {
  const kinds = {};
  const kindOf = (node, place) => {
    if (node['x-prose']) return 'prose';
    if (node['x-accepts']) return 'accepts';
    if (node.$ref !== undefined) return kindOf(resolve(schema, node), defName(node.$ref));
    if (kinds[place] !== undefined) return place;
    const parts = [
      ...Object.entries(node.properties ?? {}).map(([key, value]) => [key, kindOf(value, `${place}.${key}`)]),
      ...(node.items ? [['[]', kindOf(node.items, `${place}.[]`)]] : []),
      ...(node.additionalProperties ? [['*', kindOf(node.additionalProperties, `${place}.*`)]] : []),
      ...(node.anyOf ?? []).flatMap((member) => Object.entries(kinds[kindOf(member, place)] ?? {})),
    ].filter(([, kind]) => kind !== undefined);
    if (parts.length === 0) return undefined;
    for (const [key, kind] of parts) {
      const known = parts.find(([other]) => other === key)?.[1];
      if (known !== kind)
        throw new Error(`${place}: ${key} is ${known} in one branch and ${kind} in another`);
    }
    kinds[place] = Object.fromEntries(parts);
    return place;
  };
  kindOf(schema, schema.title);
  return kinds;
}

/** The lists and maps that a union may hold are definitions, so that each can be asked by itself where none fits. */
function branchNames(schema) {
  const names = new Set();
  walk(schema, (node) => {
    for (const member of node.anyOf ?? []) {
      if (['array', 'object'].includes(resolve(schema, member).type)) names.add(defName(member.$ref));
    }
  });
  return [...names].sort();
}

/** Validators of the whole and of each branch. Their errors carry the part of the schema that they come from. */
async function validators(schema, branches) {
  const ajv = new Ajv2020({
    allErrors: true,
    messages: false,
    verbose: true,
    inlineRefs: false,
    allowUnionTypes: true,
    schemas: [withoutTelling(schema)],
    code: { source: true, esm: true, formats: _`require("./formats.ts")` },
    formats: { date: () => true, period: () => true },
  });
  ajv.addKeyword('x-expects');
  const names = branches.map((name) => [name, `${schema.$id}#/$defs/${name}`]);
  const code = standalone
    .default(ajv, { [schema.title]: schema.$id, ...Object.fromEntries(names) })
    // Ajv copies all errors at each step into a definition: a minute for a list of 20 000 faults.
    .replace(/vErrors\.concat\((\w+\.errors)\)/g, 'appended(vErrors, $1)')
    .concat('function appended(all, more) { for (const error of more) all.push(error); return all; }');
  const bundled = await build({
    stdin: { contents: code, resolveDir: manifestFolder },
    bundle: true,
    format: 'esm',
    minifyWhitespace: true,
    minifySyntax: true,
    write: false,
  });
  return `${banner}\n${bundled.outputFiles[0].text}`;
}

function validatorTypes(schema, branches) {
  return `${banner}
import type { ErrorObject } from 'ajv';

interface Validator {
  (data: unknown): boolean;
  errors?: null | ErrorObject[];
}
${[schema.title, ...branches].map((name) => `export const ${name}: Validator;`).join('\n')}
`;
}

function walk(node, visit) {
  if (node === null || typeof node !== 'object') return;
  visit(node);
  for (const value of Object.values(node)) walk(value, visit);
}

/** The schema without what only people and seals read. */
function withoutTelling(schema) {
  const telling = ['description', 'default', 'x-unit', 'x-source', 'x-prose', 'x-accepts'];
  const text = JSON.stringify(schema, (key, value) =>
    telling.includes(key) && typeof value !== 'object' ? undefined : value,
  );
  return JSON.parse(text);
}

/** The same schema with the keys that maps share (`allOf`) and the demands on names written out where they are used. */
function writtenOut(schema) {
  const write = (node) => {
    if (Array.isArray(node)) return node.map(write);
    if (node === null || typeof node !== 'object') return node;
    const { allOf, unevaluatedProperties, ...rest } = mapValues(node, write);
    if (rest.propertyNames !== undefined) rest.propertyNames = resolve(schema, rest.propertyNames);
    if (allOf === undefined) return rest;
    const shared = allOf.map((member) => write(resolve(schema, member)).properties);
    return {
      ...rest,
      properties: Object.assign({}, ...shared, rest.properties),
      additionalProperties: unevaluatedProperties,
    };
  };
  return write(schema);
}

function resolve(schema, node) {
  return node.$ref === undefined ? node : resolve(schema, schema.$defs[defName(node.$ref)]);
}

function defName(reference) {
  return reference.slice('#/$defs/'.length);
}

function mapValues(object, change) {
  return Object.fromEntries(Object.entries(object).map(([key, value]) => [key, change(value)]));
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  await writeGenerated();
  await writeReadme();
}
