import { lintProcedure } from '../lint';
import { plugHold } from './plug-hold';
import { walkRound } from './walk-round';

it('is sound with the procedure that it calls, so that a browser may publish both', () => {
  const published = (id: string, version: number) =>
    id === plugHold.id && version === 1 ? { document: plugHold, isWithdrawn: false } : undefined;
  for (const document of [plugHold, walkRound]) {
    const { errors, warnings } = lintProcedure(document, { published });
    expect([document.id, errors, warnings]).toEqual([document.id, [], []]);
  }
  expect(Object.keys(lintProcedure(walkRound, { published }).waysToFindings).sort()).toEqual([
    'leakyIntake',
    'notCompleted',
    'tightIntake',
  ]);
});
