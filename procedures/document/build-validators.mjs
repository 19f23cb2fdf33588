/*
 * Compiles the JSON Schemas to plain functions, so that nothing evaluates code at run time (the app's content security
 * policy forbids it). The output is a plain CommonJS module with its types beside it: the app's bundler, the server's
 * compiler and Jest all take it as it is. Both are committed, and a spec holds them against what this gives.
 */
import { mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import Ajv2020 from 'ajv/dist/2020.js';
import standaloneCode from 'ajv/dist/standalone/index.js';

const procedures = join(dirname(fileURLToPath(import.meta.url)), '..');

/** Schema, the compiled module beside it without its ending, and the function in it. */
const validators = [
  {
    schema: 'document/procedure-document.schema.json',
    file: 'document/compiled/procedure-document-validator',
    name: 'checkProcedureDocument',
  },
  { schema: 'engine/run-event.schema.json', file: 'engine/compiled/run-event-validator', name: 'checkRunEvent' },
];

/** JSON Schema counts characters (code points), not UTF-16 code units. */
const countCharacters = '(text) => [...text].length';

const madeBy = '// Made by build-validators.mjs from the schema; not to be edited.';

/** The compiled text of a schema. */
function compiledText(schema, name) {
  const ajv = new Ajv2020({
    allErrors: true,
    discriminator: true,
    strict: true,
    // The unions name `kind` as required beside their alternatives, which describe it.
    strictRequired: false,
    // Definitions stay functions of their own: inlined, the steps would be written out many times over.
    inlineRefs: false,
    code: { source: true, lines: true },
  });
  const code = standaloneCode(ajv, ajv.compile(schema));
  const body = code
    .replace(/^"use strict";/, '')
    .replace(/module\.exports = (\w+);\s*module\.exports\.default = \1;/, `exports.${name} = $1;`)
    .replace(/(const \w+ = )require\("ajv\/dist\/runtime\/ucs2length"\)\.default;/, `$1${countCharacters};`);
  if (/\brequire\(/.test(body))
    throw new Error(`${name} needs a module at run time; change the schema so that it does not`);
  if (!body.includes(`exports.${name} = `)) throw new Error(`${name}: the compiled form is not as expected`);
  return `'use strict';\n${madeBy}\n${body}\n`;
}

/** What TypeScript sees of it. */
function typesText(file, name) {
  const from = file.startsWith('document/') ? '../schema-error' : '../../document';
  return `${madeBy}\nimport type { CompiledValidator } from '${from}';\n\nexport declare const ${name}: CompiledValidator;\n`;
}

/** Every compiled file with its text, by path below procedures/. */
function compiledFiles() {
  return validators.flatMap(({ schema, file, name }) => [
    { file: `${file}.js`, text: compiledText(JSON.parse(readFileSync(join(procedures, schema), 'utf8')), name) },
    { file: `${file}.d.ts`, text: typesText(file, name) },
  ]);
}

// With --check nothing is written: it fails when a compiled file is not what its schema gives.
if (process.argv.includes('--check')) {
  const stale = compiledFiles().filter(({ file, text }) => readFileSync(join(procedures, file), 'utf8') !== text);
  for (const { file } of stale)
    console.error(`procedures/${file} is not what its schema gives: npm run build:document`);
  process.exitCode = stale.length === 0 ? 0 : 1;
} else {
  for (const { file, text } of compiledFiles()) {
    mkdirSync(dirname(join(procedures, file)), { recursive: true });
    writeFileSync(join(procedures, file), text);
  }
}
