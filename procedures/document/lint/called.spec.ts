import { lintProcedure } from '../lint';
import type { ProcedureDocument } from '../procedure-document';
import { changedDocument } from '../testing/changed-document';
import { everyKind } from '../testing/every-kind';
import { partTest } from '../testing/part-test';
import type { CalledVersion } from './called';

const call = everyKind.steps.findIndex(({ kind }) => kind === 'call');

function said(document: ProcedureDocument, version: CalledVersion | undefined): readonly string[] {
  const published = (id: string, asked: number): CalledVersion | undefined =>
    id === 'part-test' && asked === 1 ? version : undefined;
  return lintProcedure(document, { published })
    .errors.filter(({ rule }) => rule === 'called')
    .map(({ message }) => message);
}

const standing: CalledVersion = { document: partTest, isWithdrawn: false };

describe('a call of another procedure', () => {
  it('is sound where the version stands and has what is taken of it', () => {
    expect(lintProcedure(everyKind, { published: () => standing }).errors).toEqual([]);
  });

  it('is refused where nothing is published under that id and version', () => {
    expect(said(everyKind, undefined)).toEqual([
      'Step 16: calls part-test, version 1, which is not published. Publish it first.',
    ]);
  });

  it('is refused where the version was withdrawn', () => {
    expect(said(everyKind, { ...standing, isWithdrawn: true })).toEqual([
      'Step 16: calls part-test, version 1, which was withdrawn. Call a standing version.',
    ]);
  });

  it('is refused where a result is not there, or is of another kind', () => {
    const other = changedDocument(everyKind, [`steps/${call}/takes/0`, (part) => (part['from'] = 'nothing')]);
    expect(said(other, standing)).toEqual(['Step 16: takes `nothing`, and no quantity there is called that.']);
    const absolute = changedDocument(everyKind, [`steps/${call}/takes/0`, (part) => (part['sense'] = 'absolute')]);
    expect(said(absolute, standing)).toEqual([
      'Step 16: takes `partPressure` as `pressureThere` in another unit: there it is kPa gauge. Give it the same.',
    ]);
  });

  it('is refused where a finding is not there', () => {
    const other = changedDocument(everyKind, [`steps/${call}/finds/0`, (part) => (part['finding'] = 'seals')]);
    expect(said(other, standing)).toEqual([
      'Step 16: asks for the finding `seals`; part-test, version 1 has tight, leaks, unfinished.',
    ]);
  });

  it('is refused where a pair is called by what is none', () => {
    const pair: CalledVersion = { document: { ...partTest, pair: true }, isWithdrawn: false };
    expect(said({ ...everyKind, pair: false }, pair)[0]).toMatch(/which is run in halves, and this one is not/);
    expect(said(everyKind, pair)).toEqual([]);
  });

  it('is refused where it comes back', () => {
    const circle: CalledVersion = { document: { ...everyKind, id: 'part-test' }, isWithdrawn: false };
    const asking = changedDocument(everyKind, [
      `steps/${call}`,
      (part) => Object.assign(part, { takes: [], finds: [], next: [] }),
    ]);
    expect(said(asking, circle)).toEqual([
      'Step 16 calls part-test, which calls this procedure again. Take one of the calls out.',
    ]);
  });
});

it('a reading that ends with a step that is not there is refused', () => {
  const document = changedDocument(everyKind, ['steps/3/reads/0/validity', (part) => (part['until'] = ['start-up'])]);
  expect(lintProcedure(document).errors).toContainEqual(
    expect.objectContaining({
      rule: 'references',
      message: 'Step 4: manifoldPressure holds until `start-up`, and no step is called that.',
    }),
  );
});
