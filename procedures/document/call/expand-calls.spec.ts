import { compileProcedure } from '../compile-procedure';
import { lintProcedure } from '../lint';
import type { CallStep, ProcedureDocument, Step } from '../procedure-document';
import { changedDocument } from '../testing/changed-document';
import { everyKind } from '../testing/every-kind';
import { partTest } from '../testing/part-test';
import { expandCalls, type Expansion, type ProcedureLibrary } from './expand-calls';

const library: ProcedureLibrary = (id, version) => (id === partTest.id && version === 1 ? partTest : undefined);

function expanded(document: ProcedureDocument, from: ProcedureLibrary = library): Extract<Expansion, { ok: true }> {
  const expansion = expandCalls(document, from);
  if (!expansion.ok) throw new Error(expansion.problems.map(({ message }) => message).join('\n'));
  return expansion;
}

function refusal(document: ProcedureDocument, from: ProcedureLibrary): string {
  const expansion = expandCalls(document, from);
  return expansion.ok ? 'accepted' : expansion.problems.map(({ message }) => message).join('\n');
}

const { document, blocks } = expanded(everyKind);
const callAt = everyKind.steps.findIndex(({ kind }) => kind === 'call');
const callPath = `steps/${callAt}`;
const step = (id: string): Step | undefined => document.steps.find((candidate) => candidate.id === id);

describe('a called procedure written into its caller', () => {
  it('is begun where the call was gone to, and its steps stand before it', () => {
    expect(step('again')).toMatchObject({
      otherwise: { to: 'part-start' },
      cannotMeasure: { to: 'part-start' },
    });
    expect(document.steps.map(({ id }) => id).slice(callAt, callAt + 8)).toEqual([
      'part-start',
      'part-cap',
      'part-press',
      'part-back',
      'partTight',
      'partLeaks',
      'partUnfinished',
      'part',
    ]);
    expect(step('part-press')?.number).toBe('16.3');
  });

  it('shows what holds throughout before its first step, which is no second start card', () => {
    expect(step('part-start')).toMatchObject({
      kind: 'action',
      title: 'Part test',
      cautions: [{ word: 'warning', text: 'Stored pressure can throw off a cap.' }],
      notes: ['Engine off.'],
    });
  });

  it('keeps its names apart, in expressions, templates and limits', () => {
    expect(step('part-press')).toMatchObject({
      reads: [{ name: 'partPartPressure', gear: 'gauge' }],
      next: [
        {
          when: 'partPartPressure < partLeast',
          because: '{partPartPressure} is below {partLeast}',
          verdict: 'partLeaks',
        },
        { to: 'part-press', thenceforth: { to: 'part-back', verdict: 'partUnfinished' } },
      ],
      otherwise: { to: 'part-back', verdict: 'partTight' },
    });
    expect(step('partTight')).toMatchObject({ verdict: 'It is tight: {partPartPressure}.' });
    expect(document.limits.map(({ id, of }) => [id, of])).toEqual([
      ['ceiling', ['gauge', 'manifold', 'gaugeLeft']],
      ['part-low-ceiling', ['gauge', 'partPartPressure']],
    ]);
    expect(step('part')).toMatchObject({
      takes: [{ from: 'partPartPressure', name: 'pressureThere' }],
      finds: [{ finding: 'partTight', name: 'itHeld' }],
    });
  });

  it('shares what is the same for both: the site’s inputs, the same need of gear, pictures', () => {
    expect(document.inputs.map(({ name }) => name)).toEqual(['elevation', 'sealHigh', 'partLeast']);
    expect(document.gear.map(({ role }) => role)).toEqual(['gauge', 'scanTool', 'barometer', 'partProbe']);
    expect(document.pictures).toEqual(['air-path']);
  });

  it('says which steps and limits are the called one’s own', () => {
    expect(blocks).toHaveLength(1);
    expect(blocks[0]).toMatchObject({ call: 'part', first: 'part-start' });
    expect([...(blocks[0]?.steps ?? [])]).toEqual(document.steps.slice(callAt, callAt + 7).map(({ id }) => id));
    expect([...(blocks[0]?.limits ?? [])]).toEqual(['part-low-ceiling']);
  });

  it('compiles, with every name known', () => {
    const compilation = compileProcedure(everyKind, library);
    expect(compilation).toMatchObject({ ok: true });
    if (!compilation.ok) return;
    expect(compilation.procedure.blockOf('part-press')?.call).toBe('part');
    expect(compilation.procedure.blockOf('part')).toBeUndefined();
    expect(compilation.procedure.declared('partPartPressure')?.label).toBe('Part pressure');
  });

  it('can be called twice without its names meeting', () => {
    const first = everyKind.steps.find((candidate): candidate is CallStep => candidate.kind === 'call');
    if (first === undefined) throw new Error('no call');
    const second: CallStep = {
      ...first,
      id: 'later',
      number: '17',
      takes: [],
      finds: [{ finding: 'leaks', name: 'laterLeak' }],
      next: [],
    };
    const twice = changedDocument(everyKind, [`${callPath}/otherwise`, (part) => (part['to'] = 'later')]);
    const both = { ...twice, steps: [...twice.steps.slice(0, callAt + 1), second, ...twice.steps.slice(callAt + 1)] };
    expect(compileProcedure(both, library)).toMatchObject({ ok: true });
    expect(expanded(both).blocks.map(({ call }) => call)).toEqual(['part', 'later']);
  });
});

describe('calls within calls', () => {
  const middle: ProcedureDocument = { ...everyKind, id: 'middle-test', pair: false };
  const outer = changedDocument(
    everyKind,
    [
      callPath,
      (part) =>
        Object.assign(part, { procedure: 'middle-test', takes: [], finds: [{ finding: 'seals', name: 'itHeld' }] }),
    ],
    [`${callPath}/next/0`, (part) => Object.assign(part, { when: 'itHeld', because: 'it sealed' })],
  );
  const both: ProcedureLibrary = (id) => (id === 'middle-test' ? middle : id === 'part-test' ? partTest : undefined);

  it('are followed, inner blocks first', () => {
    const { blocks: found, document: whole } = expanded(outer, both);
    expect(found.map(({ call, first }) => [call, first])).toEqual([
      ['part-part', 'part-part-start'],
      ['part', 'part-start'],
    ]);
    expect(found[1]?.steps.has('part-part-press')).toBe(true);
    expect(new Set(whole.steps.map(({ id }) => id)).size).toBe(whole.steps.length);
    expect(compileProcedure(outer, both)).toMatchObject({ ok: true });
  });

  it('are refused where they come back to the beginning', () => {
    const own: ProcedureLibrary = (id) => (id === 'part-test' ? { ...everyKind, id: 'part-test' } : undefined);
    expect(refusal(everyKind, own)).toMatch(/Step 16 calls part-test, which calls this procedure again/);
  });

  it('are refused below the third', () => {
    const deeper: ProcedureLibrary = (id) => {
      const depth = Number(id.replace('level-', ''));
      const next = `level-${depth + 1}`;
      return changedDocument({ ...everyKind, id }, [callPath, (part) => (part['procedure'] = next)]);
    };
    const begin = changedDocument(everyKind, [callPath, (part) => (part['procedure'] = 'level-1')]);
    expect(refusal(begin, deeper)).toMatch(/calls level-4 at depth 4; at most 3 are followed/);
  });
});

it('says which step calls what is not here', () => {
  expect(refusal(everyKind, () => undefined)).toBe(
    'Step 16 calls part-test, version 1, which is not here. Publish or fetch it first.',
  );
});

it('leaves a document without calls as it is', () => {
  expect(expanded(partTest).document).toBe(partTest);
});

it('is called with a procedure that is sound by itself', () => {
  expect(lintProcedure(partTest).errors).toEqual([]);
});
