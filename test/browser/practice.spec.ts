import type { Page } from '@playwright/test';
import { headerHash, type RunHeader } from '../../procedures/engine';
import { listenToTheBench, tap, walkTo, type Answers } from './support/at-the-car';
import { practiceSeen, watchPractice } from './support/practice-edge';
import { pushByHand } from './support/push-by-hand';
import { expect, test } from './support/test';
import { readyWithoutNetwork, signIn, signOut } from './support/visits';
import { eventsOnTablet, rowsOf, storedOnTablet } from './support/what-is-kept';

/** What a careful apprentice enters, told by the bench alone. */
const coldMorning: Answers = {
  gear: { gauge: 'G-12', scanTool: 'S-3', probe: 'L-2', barometer: 'B-1', thermometer: 'T-4' },
  read: { '2e': ['14', '13'], '4': ['1014'], '5': ['94.0'], '6': ['93.7'], '15b': ['0.0'] },
  way: { '4': 'Altimeter setting' },
  codes: { '3': ['P0068 stored', 'P0171 pending'], '18a': ['P0068 stored', 'P0171 pending'] },
  choose: {
    '13': ['Only at the manifold valve'],
    '17b': ['Carbon on it'],
    '18b': ['They are cleared'],
    '19': ['The other half is still to come'],
  },
  text: { '17b': 'a black crust on one side of the plate' },
  listen: listenToTheBench,
};

test('an apprentice finds a planted fault without a network, is told so, and nothing of it is ever sent', async ({
  product,
  switchOn,
}) => {
  test.setTimeout(180_000);
  const { page, context } = await switchOn();
  await signIn(page, 'brandt');
  await readyWithoutNetwork(page);
  await context.setOffline(true);

  await page.goto('/practice');
  await expect(page.locator('bay-practice-bay-page')).toHaveClass(/practice-edge/);
  await page.getByRole('button', { name: /Start\s+A cold morning, hissing somewhere/ }).click();
  await expect(page.locator('bay-run-header')).toContainText('Practice');
  await watchPractice(page);
  const runId = new URL(page.url()).pathname.split('/').at(-1) ?? '';

  await walkTo(page, '5', coldMorning);
  await expect(page.getByRole('region', { name: 'What the bench shows' })).toContainText('94.0 kPa');
  await tap(page.getByRole('button', { name: 'nothing disturbed' }));
  await tap(page.getByRole('button', { name: 'Back to the step' }));
  await tap(page.getByRole('button', { name: 'Stop, supply off' }));
  await tap(page.getByRole('button', { name: 'Back to step 5' }));
  await walkTo(page, 'the end', coldMorning);
  for (const name of [/Keep the write-up/, /To the closing/, 'Close the run', 'To the debrief']) {
    await tap(page.getByRole('button', { name }));
  }

  await expect(page.getByRole('heading', { name: 'You found what was planted.' })).toBeVisible();
  await expect(page.getByText('Carbon on the plate holds the manifold valve open')).toBeVisible();
  await expect(page.getByText(/All \d+ as the instruments showed them/)).toBeVisible();
  await page.getByRole('link', { name: 'Back to the Practice bay' }).click();
  await expect(page.getByText('tried once, found once')).toBeVisible();

  const { screens, unmarked } = await practiceSeen(page);
  expect(unmarked).toEqual([]);
  for (const seen of [/^Step 2d.* bay-caution-gate$/, /^Step 5.* bay-stop-sheet$/, /^Step 11 /, /^Step 17b /]) {
    expect(screens).toContainEqual(expect.stringMatching(seen));
  }

  await context.setOffline(false);
  await page.goto('/');
  await expect(page.getByText(/All sent/)).toBeVisible({ timeout: 30_000 });
  await nothingOfItIsWork(page, product.databaseUrl, runId);
});

/** Its own store holds it, as practice; the outbox, the server and the Record room do not, not even by hand. */
async function nothingOfItIsWork(page: Page, databaseUrl: string, runId: string): Promise<void> {
  const rows = await storedOnTablet(page, 'runs', 'bayhand-practice');
  const header = rows.find((row) => row['runId'] === runId)?.['header'] as RunHeader;
  const events = await eventsOnTablet(page, runId, 'bayhand-practice');
  expect(header.kind).toBe('practice');
  expect(events[0]?.['prev']).toBe(headerHash(header));
  for (const store of ['outbox', 'runs', 'events', 'blobs']) expect(await storedOnTablet(page, store)).toEqual([]);

  const [refused] = await pushByHand(page, 'brandt', { header, events });
  expect(refused).toMatchObject({ runId, acceptedThrough: 0, problem: { code: 'practice', status: 422 } });
  const [disguised] = await pushByHand(page, 'brandt', { header: { ...header, kind: 'real' }, events });
  expect(disguised).toMatchObject({ runId, acceptedThrough: 0, problem: { code: 'broken-chain' } });
  for (const table of ['run', 'run_event']) {
    expect(await rowsOf(databaseUrl, `SELECT run_id FROM ${table} WHERE run_id = $1`, [runId])).toEqual([]);
  }

  await signOut(page, 'T. Brandt');
  await signIn(page, 'lindqvist');
  await page.goto('/records');
  await page.getByRole('searchbox', { name: /^Find by order/ }).fill('PRACTICE-2');
  await expect(page.getByRole('heading', { name: 'No record fits' })).toBeVisible();
}
