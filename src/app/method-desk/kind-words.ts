import type { StepKind } from '../../../procedures/document';

/** A kind of step as it is said at the desk. */
export const kindWords: Readonly<Record<StepKind, string>> = {
  start: 'Start card',
  action: 'Do and confirm',
  reading: 'Reading',
  choice: 'Choice',
  ramp: 'Ramp',
  listen: 'Listen',
  hold: 'Hold',
  wait: 'Wait',
  codes: 'Trouble codes',
  drive: 'Road test',
  photo: 'Photo',
  call: 'Called procedure',
  compute: 'Computation',
  restore: 'Restore',
  finding: 'Finding',
};
