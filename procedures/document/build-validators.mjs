/*
 * Compiles the JSON Schemas to plain functions, so that nothing evaluates code at run time (the app's content security
 * policy forbids it). The output is TypeScript without checks: the app's bundler, the server's compiler and Jest all
 * take it as it is. It is committed, and a spec holds it against what this gives.
 */
import { mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import Ajv2020 from 'ajv/dist/2020.js';
import standaloneCode from 'ajv/dist/standalone/index.js';

const procedures = join(dirname(fileURLToPath(import.meta.url)), '..');

/** Schema, the compiled file beside it, and the function in it. */
const validators = [
  {
    schema: 'document/procedure-document.schema.json',
    file: 'document/compiled/procedure-document-validator.ts',
    name: 'checkProcedureDocument',
  },
  { schema: 'engine/run-event.schema.json', file: 'engine/compiled/run-event-validator.ts', name: 'checkRunEvent' },
];

/** JSON Schema counts characters (code points), not UTF-16 code units. */
const countCharacters = '(text) => [...text].length';

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
    code: { source: true, esm: true, lines: true },
  });
  const code = standaloneCode(ajv, ajv.compile(schema));
  const body = code
    .replace(/^"use strict";/, '')
    .replace(/export const validate = (\w+);\s*export default \1;/, `export const ${name} = $1;`)
    .replace(/(const \w+ = )require\("ajv\/dist\/runtime\/ucs2length"\)\.default;/, `$1${countCharacters};`);
  if (/\brequire\(/.test(body))
    throw new Error(`${name} needs a module at run time; change the schema so that it does not`);
  if (!body.includes(`export const ${name} = `)) throw new Error(`${name}: the compiled form is not as expected`);
  return `// @ts-nocheck\n// Made by build-validators.mjs from the schema; not to be edited.\n${body}\n`;
}

/** Every compiled file with its text, by path below procedures/. */
function compiledFiles() {
  return validators.map(({ schema, file, name }) => ({
    file,
    text: compiledText(JSON.parse(readFileSync(join(procedures, schema), 'utf8')), name),
  }));
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
