import { join } from 'node:path';
import { expect, test } from '@playwright/test';
import { build } from 'esbuild';
import fc from 'fast-check';
import { walkAtRandom } from '../support/random-walk';
import { replayStored, type ReplayedRun, type StoredRun } from './support/replay-in-page';

/** The engine as one script for a page, with the bundler that the app is built with. */
async function engineScript(): Promise<string> {
  const bundle = await build({
    entryPoints: [join(__dirname, 'support/replay-in-page.ts')],
    bundle: true,
    write: false,
    format: 'iife',
    globalName: 'engine',
    platform: 'browser',
    target: 'es2022',
    logLevel: 'silent',
  });
  const [file] = bundle.outputFiles;
  if (file === undefined) throw new Error('nothing was bundled');
  return file.text;
}

/** Random runs, the same each time; one has an event that was changed, so that a refusal is compared too. */
function storedRuns(): readonly StoredRun[] {
  const ways = fc.tuple(
    fc.constantFrom<'cold' | 'warm'>('cold', 'warm'),
    fc.array(fc.nat({ max: 9999 }), { minLength: 20, maxLength: 400 }),
  );
  const runs = fc.sample(ways, { seed: 20261202, numRuns: 24 }).map(([half, choices]): StoredRun => {
    const { header, events } = walkAtRandom(half, choices).do({ do: 'close' });
    return { header, events };
  });
  const [first] = runs;
  if (first === undefined) throw new Error('no run');
  const changed = first.events.map((event) => (event.seq === 10 ? { ...event, actor: 'another' } : event));
  return [...runs, { ...first, events: changed }];
}

test('the same events give the same state in Node and in Chromium, after each of them', async ({ page }) => {
  const stored = storedRuns();
  const text = JSON.stringify(stored);
  await page.goto('about:blank');
  await page.addScriptTag({ content: await engineScript() });
  const answer = await page.evaluate(
    (given) => (window as unknown as { engine: { replayStored: (runs: string) => string } }).engine.replayStored(given),
    text,
  );
  const there = JSON.parse(answer) as readonly ReplayedRun[];
  const here = JSON.parse(replayStored(text)) as readonly ReplayedRun[];
  expect(here.at(-1)?.last).toBe('refused: event 10 was changed after it was written');
  expect(there).toEqual(here);
  const states = there.reduce((sum, run) => sum + run.states.length, 0);
  expect(states).toBeGreaterThan(1500);
  test.info().annotations.push({ type: 'states compared', description: String(states) });
});
