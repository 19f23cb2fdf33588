import { lintProcedure } from './lint';
import { changedDocument, type Part } from './testing/changed-document';
import { everyKind } from './testing/every-kind';
import { errorsOf, place } from './testing/lint-cases';
import { longProcedure } from './testing/long-procedure';

it('has nothing to say about sound documents', () => {
  for (const document of [everyKind, longProcedure(20, 4)]) {
    const { errors, warnings } = lintProcedure(document);
    expect([document.id, errors, warnings]).toEqual([document.id, [], []]);
  }
});

describe('what publishing refuses', () => {
  it('names the step and the place of each', () => {
    const document = changedDocument(everyKind, [`${place('hold')}/otherwise`, (exit) => (exit['to'] = 'nowhere')]);
    expect(errorsOf(document)).toContainEqual(
      expect.objectContaining({ step: 'hold', pointer: `/${place('hold')}/otherwise` }),
    );
  });

  it('says that a document is none, and nothing more', () => {
    expect(lintProcedure({ ...everyKind, steps: [] })).toEqual({
      errors: [{ rule: 'schema', pointer: '/steps', message: '`steps`: must have at least 2.' }],
      warnings: [],
      waysToFindings: {},
    });
  });
});

describe('the shortest ways to the findings', () => {
  it('are given as the ids of their steps', () => {
    expect(lintProcedure(everyKind).waysToFindings).toEqual({
      notCompleted: ['start', 'codes-before', 'air', 'notCompleted'],
      sensorOff: ['start', 'codes-before', 'air', 'manifold', 'sensorOff'],
      seals: [
        'start',
        'codes-before',
        'air',
        'manifold',
        'dipstick',
        'raise',
        'judge',
        'still-quiet',
        'settle',
        'restore',
        'codes-after',
        'seals',
      ],
      doesNotSeal: [
        'start',
        'codes-before',
        'air',
        'manifold',
        'dipstick',
        'raise',
        'judge',
        'still-quiet',
        'settle',
        'restore',
        'codes-after',
        'doesNotSeal',
      ],
    });
  });

  it('have a stop on them only where nothing else leads there', () => {
    const onlyByStop = changedDocument(everyKind, [
      'steps',
      (list) => {
        for (const step of list as unknown as Part[]) {
          const exit = step['cannotMeasure'] as Part | undefined;
          if (exit?.['verdict'] === 'notCompleted') exit['verdict'] = 'sensorOff';
        }
      },
    ]);
    expect(lintProcedure(onlyByStop).waysToFindings['notCompleted']).toEqual([
      'start',
      'restore',
      'codes-after',
      'notCompleted',
    ]);
  });
});
