import { closeSync, openSync, readSync, statSync } from 'node:fs';
import { jsonMistake } from './json-mistake';

export type ReadProcedure =
  | { readonly ok: true; readonly value: object }
  /** One sentence for a person. */
  | { readonly ok: false; readonly sentence: string };

/** As the Method desk: the server takes no more. */
const mostBytes = 2 * 1024 * 1024;

const failures: Readonly<Record<string, string>> = {
  ENOENT: 'does not exist. Look for a slip in its name or folder.',
  ENOTDIR: 'does not exist: what should be its folder is a file.',
  ENAMETOOLONG: 'does not exist: no file has so long a name.',
  EACCES: 'cannot be read: you may not read it.',
  EPERM: 'cannot be read: you may not read it.',
};

/** Reads a file that should be a procedure document; whether it is one is the lint's to say. */
export function readProcedure(path: string, shownPath: string): ReadProcedure {
  const refused = (why: string): ReadProcedure => ({ ok: false, sentence: `${shownPath} ${why}` });
  const read = bytesOf(path);
  if (typeof read === 'string') return refused(read);
  let text: string;
  try {
    text = new TextDecoder('utf-8', { fatal: true }).decode(read);
  } catch (error) {
    // TextDecoder throws TypeError on bytes that are not UTF-8.
    if (error instanceof TypeError) return refused('is not UTF-8 text. Save it as UTF-8 and check it again.');
    throw error;
  }
  const mistake = jsonMistake(text);
  if (mistake !== undefined) {
    const { line, column, expected } = mistake;
    return refused(`is not JSON: at line ${line}, column ${column} there should be ${expected}.`);
  }
  const value: unknown = JSON.parse(text);
  return typeof value === 'object' && value !== null && !Array.isArray(value)
    ? { ok: true, value }
    : refused('is JSON, but no procedure: a procedure begins with { and names its format.');
}

/** The bytes, or what is the matter with the file; never more than a procedure may have. */
function bytesOf(path: string): Uint8Array | string {
  try {
    // Before it is opened: opening a pipe would wait for whoever writes into it.
    const status = statSync(path);
    if (status.isDirectory()) return "is a folder. Name the procedure's own file.";
    if (!status.isFile()) return 'is no ordinary file.';
    const bytes = beginningOf(path, mostBytes + 1);
    return bytes.length > mostBytes ? 'has more than 2 MB, and no procedure may. Name its own file.' : bytes;
  } catch (error) {
    const { code } = error as NodeJS.ErrnoException;
    if (code === undefined) throw error;
    return failures[code] ?? `cannot be read (${code}).`;
  }
}

function beginningOf(path: string, length: number): Uint8Array {
  const file = openSync(path, 'r');
  try {
    const bytes = new Uint8Array(length);
    let filled = 0;
    while (filled < length) {
      const read = readSync(file, bytes, filled, length - filled, null);
      if (read === 0) break;
      filled += read;
    }
    return bytes.subarray(0, filled);
  } finally {
    closeSync(file);
  }
}
