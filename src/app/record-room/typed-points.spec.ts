import { CUSTOM_ELEMENTS_SCHEMA } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import type { RunCommand } from '../../../procedures/engine';
import { hotIdleWhistle } from '../shared/practice/hot-idle-whistle';
import { compiledLibraryProcedure, walkScenario } from '../shared/testing/walk-scenario';
import { PointsView } from './points-view';
import type { PointsLine } from './story-line';
import { tellStory } from './tell-story';
import { seriesOfPoints } from './typed-points';

const procedure = compiledLibraryProcedure();

/** What is not counted of a run in which a ramp is typed first, then something else is done, then it is begun anew. */
function pointsBefore(...commands: readonly RunCommand[]): readonly PointsLine[] {
  const { header, events } = walkScenario(procedure, hotIdleWhistle, {
    choices: { 'still-quiet': ['stillQuiet'], 'clear-codes': ['codesCleared'], 'other-half': ['otherHalfToCome'] },
    before: (step, walk) => {
      const claims = walk.state.walked.filter((claim) => claim.step === 'raise-and-listen');
      if (step.id !== 'raise-and-listen' || claims.length > 1) return;
      const typed: readonly RunCommand[] = [
        { do: 'acknowledge-caution', caution: 0 },
        { do: 'acknowledge-caution', caution: 1 },
        { do: 'record', name: 'gauge', text: '0.0', unit: 'kPa', timeS: 0 },
        { do: 'mark', mark: 'noise-begins', timeS: 3, by: 'tap' },
        { do: 'record', name: 'gauge', text: '2.4', unit: 'kPa', timeS: 6 },
        { do: 'record', name: 'gauge', text: '4.0', unit: 'kPa', timeS: 12 },
        ...commands,
        { do: 'redo', step: 'raise-and-listen', reason: 'the ramp is begun anew' },
      ];
      typed.forEach((command) => walk.do(command));
    },
  });
  const { passages } = tellStory(procedure, header, events).story;
  return passages.flatMap(({ lines }) => lines.filter((line) => line.kind === 'points'));
}

it('keeps every point that was typed before the step was left behind, with its marks', () => {
  const [line, ...others] = pointsBefore();
  expect(others).toEqual([]);
  expect(line?.points.map(({ timeS, text, unit }) => `${timeS} s ${text} ${unit}`)).toEqual([
    '0 s 0.0 kPa',
    '6 s 2.4 kPa',
    '12 s 4.0 kPa',
  ]);
  expect(line?.marks['noise-begins']).toMatchObject({ timeS: 3 });
  expect(seriesOfPoints(line?.points ?? [])).toEqual({
    timeS: [0, 6, 12],
    channels: [{ name: 'gauge', unit: 'kPa', values: [0, 2.4, 4] }],
  });
});

it('says of a point that it was taken back', () => {
  const [line] = pointsBefore({ do: 'take-back', name: 'gauge', reason: 'misread' });
  expect(line?.points.map(({ text, isTakenBack }) => [text, isTakenBack])).toEqual([
    ['0.0', false],
    ['2.4', false],
    ['4.0', true],
  ]);
});

it('says beside the curve that the points do not count, and lists each on demand', async () => {
  // The drawing needs a canvas; its texts are specified with it.
  TestBed.overrideComponent(PointsView, { set: { imports: [], schemas: [CUSTOM_ELEMENTS_SCHEMA] } });
  const fixture = TestBed.createComponent(PointsView);
  fixture.componentRef.setInput('line', pointsBefore()[0]);
  fixture.componentRef.setInput('step', procedure.step('raise-and-listen'));
  fixture.componentRef.setInput('isLeft', true);
  await fixture.whenStable();
  const element = fixture.nativeElement as HTMLElement;
  expect(element.querySelector('p')?.textContent?.replace(/\s+/g, ' ').trim()).toBe(
    '3 points typed left behind: they do not count',
  );
  const rows = [...element.querySelectorAll('tbody tr')].map((row) =>
    [...row.children].map((cell) => cell.textContent),
  );
  expect(rows).toEqual([
    ['0.0 s', 'Gauge', '0.0 kPa', ''],
    ['6.0 s', 'Gauge', '2.4 kPa', ''],
    ['12.0 s', 'Gauge', '4.0 kPa', ''],
  ]);
});
