import { problemType, type AppError } from '../http/problem';
import type { PushProblem } from './sync.dto';

/** Why a run of a push was not wholly taken. */
export type RunProblemCode =
  | 'practice'
  | 'malformed'
  | 'unknown-site'
  | 'unknown-procedure'
  | 'other-header'
  | 'gap'
  | 'broken-chain'
  | 'structure'
  | 'not-allowed'
  | 'fork';

const titles: Readonly<Record<RunProblemCode, string>> = {
  practice: 'Practice stays on the tablet',
  malformed: 'An event is not in the form of an event',
  'unknown-site': 'The run is at no site of ours',
  'unknown-procedure': 'There is no such version of the procedure here',
  'other-header': 'The run began otherwise',
  gap: 'Events are missing',
  'broken-chain': 'The chain is broken',
  structure: 'An event has no place in the run',
  'not-allowed': 'An event was done without the right to do it',
  fork: 'The run has two tails',
};

const statuses: Readonly<Partial<Record<RunProblemCode, number>>> = {
  fork: 409,
  'other-header': 409,
  'not-allowed': 403,
};

export function runProblem(code: RunProblemCode, detail: string, seq?: number): PushProblem {
  return {
    type: problemType(code),
    code,
    title: titles[code],
    status: statuses[code] ?? 422,
    detail,
    ...(seq === undefined ? {} : { seq }),
  };
}

/** A known failure as the problem of one item of a push, with its field problems in the words. */
export function problemOfItem(error: AppError): PushProblem {
  const fields = (error.errors ?? []).map(({ pointer, detail }) => `${pointer}: ${detail}`);
  const detail = [error.message, ...fields].join(' ');
  return { type: problemType(error.code), code: error.code, title: error.title, status: error.status, detail };
}
