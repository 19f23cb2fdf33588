import type { Page } from '@playwright/test';
import type { Step } from '../../../procedures/document';
import { crankcaseValveSeal } from '../../../procedures/library';
import { expect } from './test';

/** What a person enters at a step, by the step's number; steps that ask for nothing have none. */
export interface Answers {
  readonly gear?: Readonly<Record<string, string>>;
  /** Digits for each thing that the step reads, in its order; a wait takes as many rounds as are given. */
  readonly read?: Readonly<Record<string, readonly string[]>>;
  /** The label of the way by which the step's quantity is known. */
  readonly way?: Readonly<Record<string, string>>;
  /** Labels of options, or of the windows of a road test. */
  readonly choose?: Readonly<Record<string, readonly string[]>>;
  readonly text?: Readonly<Record<string, string>>;
  /** Codes to be entered one by one: `P0068 stored`. */
  readonly codes?: Readonly<Record<string, readonly string[]>>;
  readonly listen?: (page: Page) => Promise<void>;
}

/** The step that the screen shows, told by its sentence. */
export async function shownStep(page: Page): Promise<Step> {
  const sentence = await page.locator('.frame h1').first().innerText();
  const step = crankcaseValveSeal.steps.find(({ action }) => action === sentence);
  if (step === undefined) throw new Error(`no step says "${sentence}"`);
  return step;
}

/** Goes on from step to step as a technician does, until the step with this number, or a finding, is on the screen. */
export async function walkTo(page: Page, number: string, answers: Answers): Promise<void> {
  const left = structuredClone({ read: answers.read ?? {}, codes: answers.codes ?? {} }) as {
    read: Record<string, string[]>;
    codes: Record<string, string[]>;
  };
  for (let taken = 0; taken < 120; taken += 1) {
    if (await page.getByText('Finding', { exact: true }).first().isVisible()) return;
    const step = await shownStep(page);
    if (step.number === number) return;
    await acknowledge(page);
    await answer(page, step, answers, left);
    await leftStep(page, step);
  }
  throw new Error(`step ${number} was not reached`);
}

/** Taps away the cautions that stand before the current step's entry. */
export async function acknowledge(page: Page): Promise<void> {
  const read = page.getByRole('button', { name: 'I have read it' });
  while (await read.isVisible()) {
    const before = await page.locator('bay-caution-gate').innerText();
    await read.click();
    await expect
      .poll(async () => ((await read.isVisible()) ? page.locator('bay-caution-gate').innerText() : 'none'))
      .not.toBe(before);
  }
}

/** Enters digits on the pad and taps the primary action. */
export async function enter(page: Page, digits: string): Promise<void> {
  for (const digit of digits) {
    const name = { '-': 'minus', '.': 'decimal point' }[digit] ?? digit;
    await page.locator('bay-number-pad').getByRole('button', { name, exact: true }).click();
  }
  await page.locator('bay-number-pad .go').click();
}

async function leftStep(page: Page, step: Step): Promise<void> {
  if (step.kind === 'wait') return;
  await expect
    .poll(async () => (await page.locator('.frame h1').first().innerText()) !== step.action, { timeout: 15_000 })
    .toBe(true);
}

async function answer(
  page: Page,
  step: Step,
  answers: Answers,
  left: { read: Record<string, string[]>; codes: Record<string, string[]> },
): Promise<void> {
  const primary = page.locator('bay-hand-side .big, bay-hand-side bay-big-action button').last();
  switch (step.kind) {
    case 'start':
      return begin(page, answers.gear ?? {});
    case 'reading':
    case 'wait': {
      const way = answers.way?.[step.number];
      if (way !== undefined) await page.getByRole('button', { name: way }).click();
      const digits = left.read[step.number]?.shift();
      if (digits === undefined) throw new Error(`nothing to read at step ${step.number}`);
      const before = await page.locator('bay-hand-side').innerText();
      await enter(page, digits);
      await expect.poll(async () => page.locator('bay-hand-side').innerText()).not.toBe(before);
      if ((left.read[step.number]?.length ?? 0) > 0) await answer(page, step, { ...answers, way: {} }, left);
      return;
    }
    case 'choice':
      for (const label of answers.choose?.[step.number] ?? []) {
        await page.locator('bay-choice-entry').getByText(label, { exact: true }).click();
      }
      if (answers.text?.[step.number] !== undefined) await page.locator('#asked').fill(answers.text[step.number] ?? '');
      return primary.click();
    case 'drive':
      await page.getByRole('button', { name: 'Parked again' }).click();
      for (const label of answers.choose?.[step.number] ?? [])
        await page.getByRole('checkbox', { name: label }).click();
      return primary.click();
    case 'codes':
      for (const code of left.codes[step.number] ?? []) await enterCode(page, code);
      return primary.click();
    case 'listen':
      if (answers.listen === undefined) throw new Error('nothing to listen to');
      return answers.listen(page);
    case 'hold':
      await primary.click();
      await page.getByRole('button', { name: /Held/ }).click({ timeout: 60_000 });
      return;
    case 'restore':
      return restoreAll(page);
    default:
      return primary.click();
  }
}

/** The start card: what must be ready, the cautions that hold throughout, the gear. */
async function begin(page: Page, gear: Readonly<Record<string, string>>): Promise<void> {
  await page.getByRole('button', { name: /All of this\s+is ready/ }).click();
  await page.getByRole('button', { name: 'I know them' }).click();
  await acknowledge(page);
  for (const { role, label } of crankcaseValveSeal.gear) {
    await expect(page.getByRole('radiogroup', { name: label })).toBeVisible();
    const instrument = gear[role];
    if (instrument === undefined) await page.getByRole('button', { name: 'Without it' }).click();
    else {
      await page.getByRole('radio', { name: new RegExp(`^${instrument}`) }).click();
      await page.getByRole('button', { name: `Take ${instrument}` }).click();
    }
  }
  await page.getByRole('button', { name: 'Begin' }).click();
}

async function enterCode(page: Page, entry: string): Promise<void> {
  const [code = '', status = 'stored'] = entry.split(' ');
  const known = page.getByRole('button', { name: new RegExp(`${code}.*Is it there`) });
  if (await known.isVisible()) await known.click();
  else {
    await page.getByRole('button', { name: /Enter (a|another) code/ }).click();
    for (const sign of code)
      await page.locator('bay-code-pad').getByRole('button', { name: sign, exact: true }).click();
  }
  await page.getByRole('radio', { name: status }).click();
  await page.getByRole('button', { name: `Keep ${code}` }).click();
}

async function restoreAll(page: Page): Promise<void> {
  const open = page.locator('bay-restore-list button');
  for (let count = await open.count(); count > 0; count = await open.count()) {
    await open.first().click();
    await expect.poll(async () => open.count()).toBeLessThan(count);
  }
  const back = page.getByRole('button', { name: /All is back/ });
  if (await back.isVisible()) await back.click();
}
