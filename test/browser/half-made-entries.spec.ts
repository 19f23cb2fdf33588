import type { Page } from '@playwright/test';
import { acknowledge, listenToTheBench, shownStep, tap, walkTo, type Answers } from './support/at-the-car';
import { expect, test } from './support/test';
import { openVisit, signIn } from './support/visits';

const coldMorning: Answers = {
  gear: { gauge: 'G-12', scanTool: 'S-3', probe: 'L-2', barometer: 'B-1', thermometer: 'T-4' },
  read: { '2e': ['14', '13'], '4': ['1014'], '5': ['94.0'], '6': ['93.7'], '15b': ['0.0'] },
  way: { '4': 'Altimeter setting' },
  codes: { '3': ['P0068 stored', 'P0171 pending'], '18a': ['P0068 stored', 'P0171 pending'] },
  choose: { '13': ['Only at the manifold valve'] },
  listen: listenToTheBench,
};

/** A practice run with the planted fault, walked up to a step whose cautions are read too. */
async function startedAt(page: Page, number: string): Promise<void> {
  await signIn(page, 'brandt');
  await page.goto('/practice');
  await page.getByRole('button', { name: /Start\s+A cold morning, hissing somewhere/ }).click();
  await expect(page.locator('bay-run-header')).toContainText('Practice');
  await reach(page, number);
}

async function reach(page: Page, number: string): Promise<void> {
  await walkTo(page, number, coldMorning);
  await acknowledge(page, (await shownStep(page)).cautions?.length ?? 0);
}

const figure = (page: Page) => page.locator('bay-reading-display .figure .num');

async function typeDigits(page: Page, digits: string): Promise<void> {
  for (const digit of digits) await page.keyboard.press(digit === '.' ? 'Period' : digit);
  await expect(figure(page)).toHaveText(digits);
}

/** Sets the run aside with a reason, leaves it for the Practice bay, and comes back. */
async function setAsideAndResume(page: Page, number: string): Promise<void> {
  const run = page.url();
  await tap(page.getByRole('button', { name: 'Set aside' }));
  await page.getByRole('button', { name: 'Phone call' }).click();
  await tap(page.locator('bay-way-out-sheet').getByRole('button', { name: 'Set aside', exact: true }));
  await tap(page.getByRole('button', { name: 'To the Bench' }));
  await expect(page).toHaveURL(/\/practice$/);
  await page.goto(run);
  await tap(page.getByRole('button', { name: `Go on with step ${number}` }));
}

test('a half-typed reading outlives a reload, a killed browser and a pause, and never shows at the next step', async ({
  switchOn,
}) => {
  test.setTimeout(150_000);
  let tablet = await switchOn();
  let { page } = tablet;
  const begunAt = Date.now();
  await startedAt(page, '5');
  await typeDigits(page, '94.');
  await page.reload();
  await tap(page.getByRole('button', { name: 'Go on with step 5' }));
  await expect(figure(page)).toHaveText('94.');

  await setAsideAndResume(page, '5');
  await expect(figure(page)).toHaveText('94.');
  await tap(page.getByRole('button', { name: 'Set aside' }));
  await expect(page.locator('#reason')).toHaveValue('');
  await page.locator('#reason').fill('Another car, quickly');

  // Chromium writes its cookies to disk 30 s late: a kill before that would cost the session.
  await page.waitForTimeout(Math.max(0, begunAt + 38_000 - Date.now()));
  const run = page.url();
  await tablet.kill();
  tablet = await switchOn();
  page = tablet.page;
  await page.goto(run);
  await tap(page.getByRole('button', { name: 'Go on with step 5' }));
  await expect(figure(page)).toHaveText('94.');
  await tap(page.getByRole('button', { name: 'Set aside' }));
  await expect(page.locator('#reason')).toHaveValue('Another car, quickly');
  await tap(page.getByRole('button', { name: 'Back to the step' }));

  await page.keyboard.press('0');
  await tap(page.locator('bay-number-pad .go'));
  await expect(page.locator('bay-run-header')).toContainText('Step 6');
  await expect(figure(page)).toHaveText('\u200b');
});

test('a choice and the words beside it outlive a reload and a pause; what is refused or missing is said over the action', async ({
  page,
}) => {
  test.setTimeout(150_000);
  await page.setViewportSize({ width: 800, height: 1280 });
  await startedAt(page, '13');
  const choice = page.locator('bay-choice-entry');
  const action = choice.locator('bay-big-action');
  await expect(action).toContainText('Choose first what you see.');

  await choice.getByText('At a joint', { exact: true }).click();
  await choice.getByText('Nowhere to be heard', { exact: true }).click();
  // It is told apart as not ready, and answers a tap all the same.
  await action.getByRole('button').click({ force: true });
  await expect(action.getByRole('alert')).toHaveText('Say above first: Which joint? Photograph it.');
  await page.locator('#asked').fill('the hose before the throttle');
  await expect(action.getByRole('alert')).toHaveCount(0);
  await tap(action.getByRole('button'));
  await expect(action.getByRole('alert')).toContainText('cannot be true beside another one');
  await expect(action.getByRole('alert')).toBeInViewport({ ratio: 1 });
  await choice.getByText('Nowhere to be heard', { exact: true }).click();
  await expect(action.getByRole('alert')).toHaveCount(0);

  const isThere = async (): Promise<void> => {
    await expect(choice.getByRole('checkbox', { name: 'At a joint' })).toBeChecked();
    await expect(choice.getByRole('checkbox', { name: 'Nowhere to be heard' })).not.toBeChecked();
    await expect(page.locator('#asked')).toHaveValue('the hose before the throttle');
  };
  await page.reload();
  await tap(page.getByRole('button', { name: 'Go on with step 13' }));
  await isThere();
  await setAsideAndResume(page, '13');
  await isThere();

  // The step before is repeated: 13 is reached anew, and nothing stands in it.
  await page.reload();
  await tap(page.getByRole('button', { name: /^Repeat step/ }));
  await expect(page.locator('bay-run-header')).not.toContainText('Step 13');
  await reach(page, '13');
  await expect(choice.getByRole('checkbox', { name: 'At a joint' })).not.toBeChecked();
  await expect(page.locator('#asked')).toHaveCount(0);
});

test('a half-typed visit outlives a reload right after the last key, with the code that is not added yet', async ({
  page,
}) => {
  await signIn(page, 'okafor');
  await openVisit(page, { Make: 'Merrow' });
  const last: [label: string, text: string, shown: string][] = [
    ['VIN', '1ZZBT4CK4LR2048', '1ZZ BT4CK4 LR2048'],
    ['Repair order', '4431', '4431'],
    ['Odometer', '61240', '61240'],
    ['Concern', 'Whistle at idle', 'Whistle at idle'],
    ['Trouble codes', 'P00', 'P00'],
  ];
  for (const [label, text, shown] of last) {
    const field = page.getByRole('textbox', { name: label });
    await field.pressSequentially(text);
    await page.reload();
    await expect(field).toHaveValue(shown);
  }
  for (const [label, , shown] of last) await expect(page.getByRole('textbox', { name: label })).toHaveValue(shown);
  await expect(page.getByRole('textbox', { name: 'Make' })).toHaveValue('Merrow');
});
