import type { Browser, Page } from '@playwright/test';
import { contentHash, type RunHeader } from '../../procedures/engine';
import type { ProcedureDocument } from '../../procedures/document';
import { crankcaseValveSeal } from '../../procedures/library';
import { tap, walkTo, type Answers } from './support/at-the-car';
import { expect, test } from './support/test';
import { readyWithoutNetwork, signIn } from './support/visits';
import { rowsOf, storedOnTablet } from './support/what-is-kept';

// What is published here would be every other file's procedure as well.
test.use({ productName: 'publishing' });

const coldCar: Answers = {
  gear: { gauge: 'G-12', scanTool: 'S-3', probe: 'L-2', barometer: 'B-1', thermometer: 'T-4' },
  read: { '2e': ['14', '13'] },
};

/** Another title, and a narrower band for a sensor at rest. */
const revised: ProcedureDocument = {
  ...crankcaseValveSeal,
  title: 'Crankcase valve seal, second edition',
  inputs: crankcaseValveSeal.inputs.map((input) => (input.name === 'placeBand' ? { ...input, default: '1.8' } : input)),
};

/** Step 5 goes on by a name that nothing has. */
const broken = JSON.parse(
  JSON.stringify(crankcaseValveSeal).replace('"tooClose(manifoldPressure)"', '"tooClose(manifoldPresure)"'),
) as object;

interface VersionRow {
  readonly version: number;
  readonly document: string;
  readonly content_hash: string;
}

test('a lead brings in and publishes version 2: tablets take it for new runs, and what is under way keeps version 1', async ({
  product,
  page,
  browser,
}) => {
  test.setTimeout(120_000);
  const versions = () =>
    rowsOf<VersionRow>(
      product.databaseUrl,
      'SELECT version, document, content_hash FROM procedure_version ORDER BY version',
    );
  const first = await versions();
  expect(first.map(({ version, content_hash }) => [version, content_hash])).toEqual([
    [1, contentHash(crankcaseValveSeal)],
  ]);

  // A technician is at the car, on version 1, and out of reach while the second one is published.
  await signIn(page, 'okafor');
  await readyWithoutNetwork(page);
  await page.getByRole('link', { name: /^Take it/ }).click();
  await expect(page.getByRole('article', { name: crankcaseValveSeal.title })).toContainText('version 1');
  const visit = page.url();
  await page.getByRole('button', { name: /Start the cold half/ }).click();
  await walkTo(page, '2d', coldCar);
  const run = page.url();
  await page.context().setOffline(true);

  const lead = await openMethodDesk(browser);
  await bringInBroken(lead);
  expect(await rowsOf(product.databaseUrl, 'SELECT id FROM procedure_draft')).toEqual([]);
  await publish(lead);
  await lead.context().close();

  const second = await versions();
  expect(second[0]).toEqual(first[0]);
  expect(second[1]).toMatchObject({ version: 2, content_hash: contentHash(revised) });
  expect(second).toHaveLength(2);
  for (const change of [`UPDATE procedure_version SET title = 'x'`, 'DELETE FROM procedure_version']) {
    await expect(rowsOf(product.servingUrl, change)).rejects.toThrow(/permission denied|append-only/);
  }

  // With the next sync the tablet has both, and offers the newer one.
  const onTablet = async () => (await storedOnTablet(page, 'procedures')).map((row) => row['version']).sort();
  expect(await onTablet()).toEqual([1]);
  await page.context().setOffline(false);
  await expect.poll(onTablet, { timeout: 20_000 }).toEqual([1, 2]);
  await page.goto(visit);
  await expect(page.getByRole('article', { name: revised.title })).toContainText('version 2');
  await page.goto('/');
  await expect(page.locator('bay-ready-list')).toContainText(/^1 procedure/);

  // The run goes on as it was begun.
  await page.goto(run);
  await tap(page.getByRole('button', { name: /Go on with step 2d/ }));
  await expect(page.locator('bay-run-header .procedure')).toHaveText(
    `Cold half, version 1: ${crankcaseValveSeal.title}`,
  );
  await walkTo(page, '3', coldCar);
  const [stored] = await storedOnTablet(page, 'runs');
  const header = stored?.['header'] as RunHeader;
  expect([header.version, header.contentHash]).toEqual([1, contentHash(crankcaseValveSeal)]);
  const received = () =>
    rowsOf(
      product.databaseUrl,
      'SELECT version, count(*)::int AS events FROM run JOIN run_event USING (run_id) WHERE run_id = $1 GROUP BY version',
      [header.runId],
    );
  await expect.poll(received, { timeout: 20_000 }).toEqual([{ version: 1, events: stored?.['seq'] }]);
});

/** A lead at a desk, on a device of their own; the list names the one version. */
async function openMethodDesk(browser: Browser): Promise<Page> {
  const context = await browser.newContext();
  const desk = await context.newPage();
  await signIn(desk, 'adeyemi');
  await desk.goto('/method');
  await expect(desk.getByRole('heading', { name: crankcaseValveSeal.title })).toBeVisible();
  const rows = desk.locator('bay-procedure-versions tbody tr');
  await expect(rows).toHaveCount(1);
  await expect(rows).toContainText(/^\s*1\s*published/);
  await expect(rows).toContainText('R. Adeyemi');
  await expect(rows.locator('code')).toHaveAttribute('title', contentHash(crankcaseValveSeal));
  return desk;
}

/** The problem is named by its step; nothing becomes a draft. */
async function bringInBroken(desk: Page): Promise<void> {
  await choose(desk, 'broken.json', broken);
  const kept = desk.getByRole('alert');
  await expect(kept).toContainText('1 problem must be mended');
  await expect(kept.getByRole('listitem')).toContainText('Step 5, Manifold pressure, key on');
  await expect(kept.getByRole('listitem')).toContainText('manifoldPresure');
  await expect(desk.locator('tr.draft')).toHaveCount(0);
}

async function publish(desk: Page): Promise<void> {
  await choose(desk, 'second-edition.json', revised);
  const draft = desk.locator('tr.draft');
  await expect(draft).toContainText('draft');
  await expect(desk.getByRole('alert')).toBeHidden();
  await draft.getByRole('button', { name: 'Publish' }).click();
  await desk.getByRole('dialog').getByRole('button', { name: 'Publish version 2' }).click();
  await expect(desk.getByText(`${revised.title} is published as version 2.`)).toBeVisible();
  await expect(desk.locator('bay-procedure-versions tbody tr')).toHaveCount(2);
  await expect(desk.locator('bay-procedure-versions tbody tr').first()).toContainText('new runs take this one');
}

async function choose(desk: Page, name: string, document: object): Promise<void> {
  const buffer = Buffer.from(JSON.stringify(document));
  await desk.locator('bay-import-panel input[type=file]').setInputFiles({ name, mimeType: 'application/json', buffer });
}
