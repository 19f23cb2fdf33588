import { compileProcedure, type Exit, type FindingStep, type Step } from '../document';
import { crankcaseValveSeal as document, library } from '.';

const noSource = 'common practice, no source';
const byId = new Map(document.steps.map((step) => [step.id, step]));
const findings = document.steps.filter((step): step is FindingStep => step.kind === 'finding');

/** Every way out of a step, Stop included, whatever its conditions: only one that asks for the verdict is answered. */
function exitsOf(step: Step, verdict?: string): readonly Exit[] {
  if (step.kind === 'finding') return [];
  const branches = (step.next ?? [])
    .filter(({ when }) => verdict === undefined || !asksForVerdict(when) || when.split(' or ').includes(verdict))
    .flatMap((branch) => [branch, ...(branch.thenceforth === undefined ? [] : [branch.thenceforth])]);
  const honest = 'cannotMeasure' in step ? [step.cannotMeasure] : [];
  return [...branches, step.otherwise, ...honest, document.stop.exit];
}

function asksForVerdict(when: string): boolean {
  return when.split(' or ').every((name) => findings.some(({ id }) => id === name));
}

interface Place {
  readonly step: Step;
  readonly apart: readonly string[];
  readonly verdict: string | undefined;
  readonly way: readonly string[];
}

/** Every place that a run can be in: the step, what is apart, and where it heads for; the shortest way to each first. */
function everyPlace(): readonly Place[] {
  const first = document.steps[0]!;
  const places: Place[] = [{ step: first, apart: [], verdict: undefined, way: [first.number] }];
  const seen = new Set<string>();
  const kept: Place[] = [];
  for (let place = places.shift(); place !== undefined; place = places.shift()) {
    const key = [place.step.id, place.verdict, ...place.apart].join('|');
    if (seen.has(key)) continue;
    seen.add(key);
    kept.push(place);
    const done =
      place.step.kind === 'restore'
        ? []
        : [...new Set([...place.apart, ...(place.step.disturbs ?? []).map(({ item }) => item)])].sort();
    for (const exit of exitsOf(place.step, place.verdict)) {
      const verdict = exit.verdict ?? place.verdict;
      const step = byId.get(exit.to === 'verdict' ? (verdict ?? 'no verdict') : exit.to);
      if (step === undefined) throw new Error(`step ${place.step.number} leads nowhere: ${exit.because}`);
      const apart = exit === document.stop.exit ? place.apart : done;
      places.push({ step, apart, verdict, way: [...place.way, step.number] });
    }
  }
  return kept;
}

/** The expressions of the document outside of its limits, with where they stand. */
function expressions(): readonly (readonly [where: string, source: string])[] {
  const found: [string, string][] = [];
  const visit = (value: unknown, where: string): void => {
    if (typeof value !== 'object' || value === null) return;
    for (const [key, member] of Object.entries(value)) {
      const isExpression = ['when', 'until', 'is', 'uncertainty', 'low', 'high'].includes(key);
      if (isExpression && typeof member === 'string') found.push([`${where}.${key}`, member]);
      visit(member, `${where}.${key}`);
    }
  };
  for (const step of document.steps) visit(step, step.id);
  return found;
}

describe('the library', () => {
  it('lists each procedure under an id of its own', () => {
    expect(library.map(({ id }) => id)).toEqual(['crankcase-valve-seal']);
  });
});

describe('crankcase valve seal', () => {
  it('compiles without a problem', () => {
    const compiled = compileProcedure(document);
    expect(compiled.ok ? [] : compiled.problems).toEqual([]);
  });

  it('is run as a pair of a cold and a warm half', () => {
    expect(document.pair).toBe(true);
  });

  it('takes every figure from an input that says where it is from', () => {
    expect(expressions().length).toBeGreaterThan(60);
    // 10 kPa, 30 s and the ceiling belong to the format's own fields; their texts say the same words.
    expect(expressions().filter(([, source]) => /\d/.test(source))).toEqual([]);
    for (const input of document.inputs) {
      if (input.from === 'default') expect(input).toMatchObject({ source: noSource, default: expect.any(String) });
    }
    const bands = document.steps.flatMap((step) => [
      ...('reads' in step ? step.reads : []),
      ...('finds' in step ? step.finds : []),
      ...('results' in step ? (step.results ?? []) : []),
    ]);
    const sources = bands.flatMap((quantity) => ('band' in quantity && quantity.band ? [quantity.band.source] : []));
    expect(sources).toEqual(Array.from({ length: 8 }, () => noSource));
    for (const [id, field] of [
      ['raise-and-listen', 'why'],
      ['hold-pressure', 'why'],
    ] as const) {
      expect(byId.get(id)?.[field]).toContain(noSource);
    }
    expect(document.limits.map(({ says }) => says)).toEqual([expect.stringContaining(noSource)]);
  });

  it('has at most one danger, one warning and one caution before a step', () => {
    for (const { id, cautions = [] } of document.steps) {
      for (const word of ['danger', 'warning', 'caution']) {
        expect([id, word, cautions.filter((caution) => caution.word === word).length <= 1]).toEqual([id, word, true]);
      }
    }
  });

  it('warns before the first pressure, before each loosening, and before the engine runs', () => {
    const warned = document.steps
      .filter(({ cautions = [] }) => cautions.some(({ word }) => word === 'warning' || word === 'danger'))
      .map(({ id }) => id);
    for (const id of ['run-engine', 'key-on', 'plug-in', 'flow-open', 'raise-and-listen', 'vent-open', 'restore']) {
      expect(warned).toContain(id);
    }
  });

  it('puts back everything on every path, Stop and cannot measure included', () => {
    const ends = everyPlace().filter(({ step }) => step.kind === 'finding');
    expect(ends.length).toBeGreaterThanOrEqual(findings.length);
    expect(ends.filter(({ apart }) => apart.length > 0).map(({ way }) => way.join(' '))).toEqual([]);
  });

  it('declares five things that are taken apart, and how each is put back', () => {
    const disturbed = document.steps.flatMap(({ disturbs = [] }) => disturbs);
    expect(disturbed.map(({ item }) => item)).toEqual([
      'dipstick',
      'inlet-duct',
      'inlet-plug',
      'vent-plug',
      'passage-access',
    ]);
    for (const { restore } of disturbed) expect(restore).toMatch(/^(Put|Fit|Take|Close) .*\.$/);
  });

  it('closes the supply, waits for the gauge and opens the vent before anything is put back', () => {
    for (const { step, way } of everyPlace()) {
      if (step.id !== 'restore') continue;
      expect(way.slice(-4)).toEqual(['15a', '15b', '15c', '16']);
    }
  });

  it('comes back to an earlier step by bounded branches alone, at most five times each', () => {
    const onward = (step: Step): readonly string[] => {
      if (step.kind === 'finding') return [];
      const branches = step.next ?? [];
      const unbounded = branches.flatMap(({ atMost, to, thenceforth }) =>
        atMost === undefined ? [to] : [thenceforth?.to ?? 'no thenceforth'],
      );
      return [...unbounded, step.otherwise.to, ...('cannotMeasure' in step ? [step.cannotMeasure.to] : [])];
    };
    const cleared = new Set<string>();
    const circle = (id: string, way: readonly string[]): readonly string[] | undefined => {
      if (cleared.has(id)) return undefined;
      if (way.includes(id)) return [...way, id];
      const step = byId.get(id);
      if (step === undefined) return id === 'verdict' ? undefined : ['no step', id];
      for (const next of onward(step)) {
        const found = circle(next, [...way, id]);
        if (found !== undefined) return found;
      }
      cleared.add(id);
      return undefined;
    };
    expect(circle('start', [])).toBeUndefined();
    const bounds = document.steps.flatMap((step) =>
      step.kind === 'finding' ? [] : (step.next ?? []).flatMap(({ atMost }) => atMost ?? []),
    );
    expect(bounds.length).toBeGreaterThan(5);
    expect(Math.max(...bounds)).toBe(5);
  });

  it('lets every measured step say that it cannot be measured, and every exit say why', () => {
    const measured = document.steps.filter(({ kind }) =>
      ['reading', 'choice', 'listen', 'hold', 'wait', 'codes', 'drive'].includes(kind),
    );
    expect(measured.length).toBeGreaterThan(20);
    for (const step of measured) expect(step).toHaveProperty('cannotMeasure.because', expect.stringMatching(/\.$/));
    for (const step of document.steps) {
      for (const { because } of exitsOf(step)) expect(because).toMatch(/^[A-Z{].{10,}\.$/);
    }
  });

  it('keeps the sentences of its steps short', () => {
    const texts = document.steps.flatMap(({ action, why = '', cautions = [] }) => [
      action,
      why,
      ...cautions.map(({ text }) => text),
    ]);
    const sentences = texts.flatMap((text) => text.split(/(?<=[.:;]) /));
    expect(sentences.filter((sentence) => sentence.split(/\s+/).length > 20)).toEqual([]);
  });

  it('says of each finding what was judged, and that the ones that prove nothing judged nothing', () => {
    const byResult = (result: string): readonly string[] =>
      document.steps.flatMap((step) => (step.kind === 'finding' && step.result === result ? [step.number] : []));
    expect([byResult('in'), byResult('too-close'), byResult('not-judged')]).toEqual([
      ['F1'],
      ['F3'],
      ['F5', 'F7', 'F11', 'F12'],
    ]);
  });

  it('ends each finding with one sentence for the customer, cold and warm', () => {
    for (const { id, customer } of findings) {
      const halves = customer.map(({ when }) => when);
      const isOne = customer.length === 1 && halves[0] === undefined;
      const isPair = halves.join() === 'cold,warm';
      expect([id, isOne || isPair || id === 'sensorReadsOffAtRest']).toEqual([id, true]);
    }
  });
});
