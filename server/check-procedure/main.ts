/*
 * npm run check-procedure FILE.json: what the Method desk would say about a document, without a server or a database.
 * Exit code 0: publishable; 1: publishing would be refused; 2: nothing could be checked.
 */
import { resolve } from 'node:path';
import { lintProcedure, validateDocument } from '../../procedures/document/authoring';
import { pictureParts } from '../../procedures/library/picture-parts';
import { readProcedure } from './read-procedure';
import { lintReport, shapeReport } from './report';

function check(file: string): number {
  // npm runs scripts in the checkout's root; the name was given where the person stands.
  const read = readProcedure(resolve(process.env['INIT_CWD'] ?? '.', file), file);
  if (!read.ok) return complain(read.sentence);
  const validation = validateDocument(read.value);
  if (!validation.ok) {
    process.stdout.write(shapeReport(file, validation.problems));
    return 1;
  }
  const report = lintProcedure(validation.document, { parts: pictureParts });
  process.stdout.write(lintReport(file, validation.document, report));
  return report.errors.length > 0 ? 1 : 0;
}

function complain(sentence: string): number {
  process.stderr.write(`${sentence}\n`);
  return 2;
}

const [file, ...more] = process.argv.slice(2);
const isOne = file !== undefined && file !== '' && more.length === 0;
process.exitCode = isOne ? check(file) : complain('Name one procedure file: npm run check-procedure FILE.json');
