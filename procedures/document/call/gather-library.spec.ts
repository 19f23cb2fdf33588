import type { ProcedureDocument } from '../procedure-document';
import { everyKind } from '../testing/every-kind';
import { partTest } from '../testing/part-test';
import { callsOf, gatherCalls, libraryOf, type CalledKey } from './gather-library';

/** The part test as it would be if it called others itself. */
function calling(...calls: readonly CalledKey[]): ProcedureDocument {
  const call = everyKind.steps.find(({ kind }) => kind === 'call');
  return { ...partTest, steps: calls.map((key, index) => ({ ...call, ...key, id: `call-${index}` }) as never) };
}

const shelf = (documents: Readonly<Record<string, ProcedureDocument>>) => {
  const asked: string[] = [];
  const fetch = async ({ procedure, version }: CalledKey) => {
    asked.push(`${procedure}/${version}`);
    const document = documents[`${procedure}/${version}`];
    return document === undefined ? undefined : { id: procedure, version, document };
  };
  return { asked, fetch };
};

describe('what a document calls', () => {
  it('is named once for each version, in the order of the steps', () => {
    expect(callsOf(everyKind)).toEqual([{ procedure: 'part-test', version: 1 }]);
    const [b, a] = [
      { procedure: 'b', version: 2 },
      { procedure: 'a', version: 1 },
    ];
    expect(callsOf(calling(b, a, b))).toEqual([b, a]);
    expect(callsOf(partTest)).toEqual([]);
  });

  it('is fetched at every depth, each version once, also where calls come back', async () => {
    const { asked, fetch } = shelf({
      'a/1': calling({ procedure: 'b', version: 1 }, { procedure: 'c', version: 1 }),
      'b/1': calling({ procedure: 'c', version: 1 }),
      'c/1': calling({ procedure: 'a', version: 1 }),
    });
    const { found, missing } = await gatherCalls(calling({ procedure: 'a', version: 1 }), fetch);
    expect(missing).toBeUndefined();
    expect(found.map(({ id }) => id)).toEqual(['a', 'b', 'c']);
    expect(asked).toEqual(['a/1', 'b/1', 'c/1']);
    const library = libraryOf(found);
    expect(library('b', 1)?.steps).toHaveLength(1);
    expect(library('b', 2)).toBeUndefined();
  });

  it('says which version is not there, and gives what is', async () => {
    const { fetch } = shelf({ 'a/1': calling({ procedure: 'b', version: 3 }) });
    const { found, missing } = await gatherCalls(calling({ procedure: 'a', version: 1 }), fetch);
    expect(missing).toEqual({ procedure: 'b', version: 3 });
    expect(found.map(({ id }) => id)).toEqual(['a']);
  });
});
