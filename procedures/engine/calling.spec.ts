import { compileProcedure } from '../document';
import { decide, expectedSteps, previewTaken, routeAhead } from '.';
import { inPartTest, outerWalk, partWith, read } from './testing/outer-walk';
import { outerProcedure } from './testing/outer-procedure';
import { RunWalk } from './testing/run-walk';

describe('a called procedure', () => {
  it('is walked step by step, its findings lead back to the step that called', () => {
    const walk = partWith(inPartTest(), '5.0');
    expect(walk.state.current?.id).toBe('part');
    expect(walk.state.walked.map(({ step }) => step)).toEqual([
      'start',
      'warm',
      'plug',
      'part-start',
      'part-cap',
      'part-press',
      'part-back',
      'part',
    ]);
    expect(walk.state.finding).toBeUndefined();
  });

  it('gives its results under the names of the caller, judged by the caller’s band', () => {
    const walk = partWith(inPartTest(), '5.0').do({ do: 'confirm' });
    expect(walk.state.values['there']).toMatchObject({
      text: '5.0',
      unit: 'kPa',
      step: 'part',
      judgement: { result: 'in' },
    });
    expect(walk.state.truths['itHeld']?.holds).toBe(true);
    expect(walk.state.truths['itLeaked']?.holds).toBe(false);
    expect(walk.state.current?.id).toBe('lead');
  });

  it('shows beforehand what is taken over, judged, and where its steps lead', () => {
    const walk = partWith(inPartTest(), '5.0');
    expect(previewTaken(walk.procedure, walk.state)).toMatchObject([
      { name: 'there', text: '5.0', judgement: { result: 'in' } },
    ]);
    const back = inPartTest().do({ do: 'confirm' }, read('partPartPressure', '5.0', 'kPa'));
    expect(routeAhead(back.procedure, back.state)).toEqual([{ to: 'part', label: '4, part test', isMain: true }]);
    // The steps of the called one count: 4 beside the 11 of the caller.
    expect(expectedSteps(walk.procedure)).toBe(15);
  });

  it('leaves the finding that the caller headed for as it was', () => {
    const walk = partWith(inPartTest(), '5.0');
    expect(walk.state.verdict).toBe('partTight');
    walk.do({ do: 'confirm' });
    expect(walk.state.verdict).toBe('early');
  });

  it('shows on the Route what the caller headed for, once the call is done', () => {
    const walk = partWith(
      inPartTest({
        ...outerProcedure,
        steps: outerProcedure.steps.map((step) =>
          step.kind === 'call' ? { ...step, next: [], otherwise: { to: 'verdict', because: 'it is done' } } : step,
        ),
      }),
      '5.0',
    );
    expect(walk.state.current?.id).toBe('part');
    expect(routeAhead(walk.procedure, walk.state).map(({ to }) => to)).toEqual(['early']);
  });

  it('can be gone through again within the caller’s bound, its own bounds counting anew', () => {
    const walk = inPartTest();
    const tooHigh = (): void => void walk.do({ do: 'confirm' }, read('partPartPressure', '16', 'kPa'));
    for (let round = 0; round < 3; round += 1) {
      if (round > 0) walk.cautions(1).do({ do: 'confirm' });
      tooHigh();
      walk.do(read('partPartPressure', '16', 'kPa'), read('partPartPressure', '1', 'kPa'), {
        do: 'restore',
        item: 'cap',
      });
      expect(walk.state.current?.id).toBe('part');
      walk.do({ do: 'confirm' });
    }
    expect(walk.state.verdict).toBe('leaky');
    expect(walk.state.current?.id).toBe('restore');
  });

  it('restores what it took apart, and leaves the caller’s to the caller', () => {
    const walk = inPartTest().do({ do: 'confirm' }, read('partPartPressure', '5.0', 'kPa'));
    expect(walk.state.disturbed.map(({ item }) => item)).toEqual(['cap', 'plug']);
    expect(walk.ask({ do: 'confirm' })).toMatchObject({ ok: false, message: 'Still to be put back: cap.' });
    walk.do({ do: 'restore', item: 'cap' });
    expect(walk.state.current?.id).toBe('part');
    expect(walk.state.disturbed.map(({ item }) => item)).toEqual(['plug']);
  });

  it('holds its own limits in its steps alone', () => {
    const within = inPartTest().do({ do: 'confirm' }, read('partPartPressure', '21', 'kPa'));
    expect(within.state.alarm).toMatchObject({ limit: 'part-low-ceiling', says: 'More than 20 kPa.' });
    const outside = partWith(inPartTest(), '5.0').do(
      { do: 'confirm' },
      { do: 'verify', by: 'brandt' },
      { do: 'release', role: 'lead', evidence: 'seen' },
      { do: 'confirm' },
      read('from', '21', 'kPa'),
    );
    expect(outside.state.alarm).toBeUndefined();
  });

  it('can be stopped in the middle: everything is put back, the caller’s too', () => {
    const walk = inPartTest().do(
      { do: 'confirm' },
      { do: 'stop', reason: '' },
      { do: 'leave-stop', how: 'not-completed', reason: 'the plug moved' },
    );
    expect(walk.state.current?.id).toBe('restore');
    walk.do({ do: 'restore', item: 'cap' }, { do: 'restore', item: 'plug' });
    expect(walk.state.finding).toBe('notCompleted');
  });

  it('keeps the hash of what was published, not of what was written in', () => {
    const { events, header, procedure } = outerWalk();
    expect(procedure.document.steps.length).toBeGreaterThan(procedure.authored.steps.length);
    expect(procedure.authored).toBe(outerProcedure);
    expect(header.contentHash).toHaveLength(64);
    expect(events.length).toBeGreaterThan(0);
  });

  it('is one step that goes on without it where nobody gave its text', () => {
    const alone = compileProcedure(outerProcedure);
    if (!alone.ok) throw new Error('not compiled');
    const walk = new RunWalk(alone.procedure);
    expect(decide(alone.procedure, walk.state, { do: 'acknowledge-caution', caution: 0 })).toMatchObject({ ok: true });
    expect(alone.procedure.blockOf('part')).toBeUndefined();
  });
});
