import { computed, signal, type Signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import type { RunWalk } from '../../../procedures/engine/testing/run-walk';
import { EntryDraft } from './entry-draft';
import type { RunView } from './run-view';
import { draftsForSpecs, SettingsForSpecs } from './testing/drafts-for-specs';
import { viewOf, walkedTo } from './testing/run-for-specs';

const settled = (): Promise<void> => new Promise((resolve) => setTimeout(resolve));
const figure = { do: 'record', name: 'manifoldPressure', text: '94.2', unit: 'kPa' } as const;

/** A page that shows the walk, on the tablet whose settings are given. */
function opened(walk: RunWalk, settings: SettingsForSpecs) {
  TestBed.resetTestingModule();
  TestBed.configureTestingModule({ providers: draftsForSpecs(settings) });
  const draft = TestBed.inject(EntryDraft);
  const run = signal(viewOf(walk));
  return { draft, run, show: () => run.set(viewOf(walk)) };
}

const fieldIn = (draft: EntryDraft, run: Signal<RunView>) => draft.field(run, () => 'figure', '', []);

/** At step 5 with `94.` typed and kept. */
async function halfTyped() {
  const walk = walkedTo('manifold-pressure');
  const settings = new SettingsForSpecs();
  const page = opened(walk, settings);
  const field = fieldIn(page.draft, page.run);
  field.set('9');
  field.set('94.');
  await settled();
  return { walk, settings, page, field };
}

/** What stands in the field after a reload. */
async function afterReload(walk: RunWalk, settings: SettingsForSpecs): Promise<string> {
  const { draft, run } = opened(walk, settings);
  await draft.recall(walk.header.runId);
  return fieldIn(draft, run)();
}

describe('EntryDraft', () => {
  it('gives back after a reload what stood in a field', async () => {
    const { walk, settings } = await halfTyped();
    expect(await afterReload(walk, settings)).toBe('94.');
  });

  it('gives it back after the run was set aside and resumed, stopped and gone on with, or asked about', async () => {
    const { walk, settings } = await halfTyped();
    walk.do({ do: 'set-aside', reason: 'Phone call' }, { do: 'resume' });
    expect(await afterReload(walk, settings)).toBe('94.');
    walk.do({ do: 'stop', reason: '' }, { do: 'leave-stop', how: 'go-back' });
    walk.do({ do: 'not-sure', question: 'Is it?' }, { do: 'resume' });
    expect(await afterReload(walk, settings)).toBe('94.');
  });

  it('is empty at the next step, and at the same step when it is taken again', async () => {
    const { walk, settings, page, field } = await halfTyped();
    walk.do(figure);
    page.show();
    expect(field()).toBe('');
    walk.do({ do: 'redo', step: 'manifold-pressure', reason: 'Read wrongly' });
    page.show();
    expect(walk.state.current?.id).toBe('manifold-pressure');
    expect(field()).toBe('');
    expect(await afterReload(walk, settings)).toBe('');
  });

  it('does not come up again when the reading that took its place is undone', async () => {
    const walk = walkedTo('cold-enough');
    const settings = new SettingsForSpecs();
    const page = opened(walk, settings);
    const field = fieldIn(page.draft, page.run);
    field.set('14');
    walk.do({ do: 'record', name: 'coolantTemperature', text: '14', unit: 'degC' });
    walk.do({ do: 'take-back', name: 'coolantTemperature', reason: 'taken back' });
    page.show();
    expect(field()).toBe('');
  });

  it('drops from the tablet what belongs to an entry that is over, and keeps what was begun since', async () => {
    const { walk, settings, page, field } = await halfTyped();
    walk.do(figure);
    page.show();
    page.draft.field(page.run, () => 'reason', '', []).set('Wet');
    page.draft.tidy(page.run());
    await settled();
    expect([...settings.rows.values()]).toEqual([{ fields: { reason: expect.objectContaining({ value: 'Wet' }) } }]);
    expect(field()).toBe('');
    walk.do({ do: 'redo', step: 'manifold-pressure', reason: 'Read wrongly' });
    page.show();
    page.draft.tidy(page.run());
    await settled();
    expect(settings.rows.size).toBe(0);
  });

  it('ends a reason with the pause that it was given for, and nothing else with it', async () => {
    const walk = walkedTo('manifold-pressure');
    const page = opened(walk, new SettingsForSpecs());
    const reason = page.draft.field(page.run, () => 'set-aside', '', ['set-aside']);
    const field = fieldIn(page.draft, page.run);
    field.set('94');
    reason.set('Phone call');
    walk.do({ do: 'set-aside', reason: 'Phone call' }, { do: 'resume' });
    page.show();
    expect([reason(), field()]).toEqual(['', '94']);
  });

  it('does not take over another run\u2019s entry', async () => {
    const { settings } = await halfTyped();
    const other = walkedTo('manifold-pressure', { header: { runId: '0193b0a0-0009-7000-8000-00000000d009' } });
    expect(await afterReload(other, settings)).toBe('');
  });

  it('keeps what was entered while the tablet still looked for what was kept', async () => {
    const { walk, settings } = await halfTyped();
    const { draft, run } = opened(walk, settings);
    const field = fieldIn(draft, run);
    const recalled = draft.recall(walk.header.runId);
    field.set('95');
    await recalled;
    expect(field()).toBe('95');
    await settled();
    expect(await afterReload(walk, settings)).toBe('95');
  });

  it('takes what another build kept in another form for nothing', async () => {
    const { walk, settings } = await halfTyped();
    const { draft, run } = opened(walk, settings);
    await draft.recall(walk.header.runId);
    expect(draft.field<readonly string[]>(run, () => 'figure', [], [])()).toEqual([]);
    const [key] = settings.rows.keys();
    settings.rows.set(key ?? '', { place: 'of an earlier build', value: ['x'] });
    expect(await afterReload(walk, settings)).toBe('');
  });

  it('tells at each change, so that a refusal goes with what was refused', async () => {
    const page = opened(walkedTo('manifold-pressure'), new SettingsForSpecs());
    const field = fieldIn(page.draft, page.run);
    let changes = 0;
    page.draft.changed.subscribe(() => (changes += 1));
    field.set('9');
    field.update((text) => `${text}4`);
    expect([computed(field)(), changes]).toEqual(['94', 2]);
  });
});
