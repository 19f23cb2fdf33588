import type { Locator, Page } from '@playwright/test';
import type { Step } from '../../../procedures/document';
import { crankcaseValveSeal } from '../../../procedures/library';
import { tapGuardMs } from '../../../src/app/run/tap-guard';
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
  /** Called when a step is on the screen, its cautions acknowledged, before it is answered. */
  readonly look?: (step: Step) => Promise<void>;
}

/** The step that the screen shows, told by its number in the header; its sentence must be the step's own. */
export async function shownStep(page: Page): Promise<Step> {
  const number = await shownNumber(page);
  const step = crankcaseValveSeal.steps.find((candidate) => candidate.number === number);
  if (step === undefined) throw new Error(`there is no step ${number}`);
  await expect(page.locator('.frame h1').first()).toHaveText(step.action);
  return step;
}

async function shownNumber(page: Page): Promise<string> {
  const chip = await page.locator('bay-run-header .chip').first().innerText();
  return /Step\s+(\S+)/.exec(chip)?.[1] ?? chip;
}

/** Goes on from step to step as a technician does, until the step with this number, or a finding, is on the screen. */
export async function walkTo(page: Page, number: string, answers: Answers): Promise<void> {
  const left = structuredClone({ read: answers.read ?? {}, codes: answers.codes ?? {} }) as {
    read: Record<string, string[]>;
    codes: Record<string, string[]>;
  };
  for (let taken = 0; taken < 120; taken += 1) {
    if (await page.locator('bay-finding-entry').isVisible()) return;
    const step = await shownStep(page);
    if (step.number === number) return;
    if (step.kind !== 'start') await acknowledge(page, step.cautions?.length ?? 0);
    await answers.look?.(step);
    await answer(page, step, answers, left);
    await leftStep(page, step);
  }
  throw new Error(`step ${number} was not reached`);
}

/** Taps at a hand's pace: a second tap inside the guard time is a bounce to the app, and would do nothing. */
export async function tap(target: Locator): Promise<void> {
  await target.waitFor();
  await target.page().waitForTimeout(tapGuardMs + 20);
  await target.click();
}

/** Taps away the cautions that stand before the current step's entry, one by one. */
export async function acknowledge(page: Page, count: number): Promise<void> {
  const gate = page.locator('bay-caution-gate');
  for (let left = count; left > 0; left -= 1) {
    const words = await gate.locator('bay-caution').innerText();
    await tap(page.getByRole('button', { name: 'I have read it' }));
    if (left > 1) await expect(gate.locator('bay-caution')).not.toHaveText(words);
    else await expect(gate).toBeHidden();
  }
}

/** Enters digits on the pad and taps the primary action. */
export async function enter(page: Page, digits: string): Promise<void> {
  await typeOnPad(page, digits);
  await tap(page.locator('bay-number-pad .go'));
}

async function typeOnPad(page: Page, digits: string): Promise<void> {
  for (const digit of digits) {
    const name = { '-': 'minus', '.': 'decimal point' }[digit] ?? digit;
    await page.locator('bay-number-pad').getByRole('button', { name, exact: true }).click();
  }
}

async function leftStep(page: Page, step: Step): Promise<void> {
  await expect.poll(() => shownNumber(page), { timeout: 15_000 }).not.toBe(step.number);
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
      if (way !== undefined) await tap(page.getByRole('button', { name: way }));
      const digits = left.read[step.number]?.shift();
      if (digits === undefined) throw new Error(`nothing to read at step ${step.number}`);
      await typeOnPad(page, digits);
      // With the digits in it: only what is recorded changes the entry further.
      const before = await page.locator('bay-hand-side').innerText();
      await tap(page.locator('bay-number-pad .go'));
      await expect.poll(async () => page.locator('bay-hand-side').innerText()).not.toBe(before);
      if ((left.read[step.number]?.length ?? 0) > 0) await answer(page, step, { ...answers, way: {} }, left);
      return;
    }
    case 'choice':
      for (const label of answers.choose?.[step.number] ?? []) {
        await page.locator('bay-choice-entry').getByText(label, { exact: true }).click();
      }
      if (answers.text?.[step.number] !== undefined) await page.locator('#asked').fill(answers.text[step.number] ?? '');
      return tap(primary);
    case 'drive':
      await tap(page.getByRole('button', { name: 'Parked again' }));
      for (const label of answers.choose?.[step.number] ?? [])
        await page.getByRole('checkbox', { name: label }).click();
      return tap(primary);
    case 'codes':
      for (const code of left.codes[step.number] ?? []) await enterCode(page, code);
      await answerKnownCodes(page);
      return tap(primary);
    case 'listen':
      if (answers.listen === undefined) throw new Error('nothing to listen to');
      return answers.listen(page);
    case 'hold':
      await tap(primary);
      await page.getByRole('button', { name: /Held/ }).click({ timeout: 45_000 });
      return;
    case 'restore':
      return restoreAll(page);
    default:
      return tap(primary);
  }
}

/** The start card: what must be ready, the cautions that hold throughout, the gear. */
async function begin(page: Page, gear: Readonly<Record<string, string>>): Promise<void> {
  await tap(page.getByRole('button', { name: /All of this\s+is ready/ }));
  await tap(page.getByRole('button', { name: 'I know them' }));
  await acknowledge(page, crankcaseValveSeal.start.throughout.length);
  for (const { role, label } of crankcaseValveSeal.gear) {
    await expect(page.getByRole('radiogroup', { name: label })).toBeVisible();
    const instrument = gear[role];
    if (instrument === undefined) await tap(page.getByRole('button', { name: 'Without it' }));
    else {
      await page.getByRole('radio', { name: new RegExp(`^${instrument}`) }).click();
      await tap(page.getByRole('button', { name: `Take ${instrument}` }));
    }
  }
  await tap(page.getByRole('button', { name: 'Begin' }));
}

/** Says of every code that the visit or an earlier step knows, and that was not entered, that it is not there. */
async function answerKnownCodes(page: Page): Promise<void> {
  const open = page.getByRole('button', { name: /^[PCBU][0-9A-F]{4}: not there$/ });
  for (let count = await open.count(); count > 0; count = await open.count()) {
    await open.first().click();
    await expect.poll(async () => open.count()).toBeLessThan(count);
  }
}

async function enterCode(page: Page, entry: string): Promise<void> {
  const [code = '', status = 'stored'] = entry.split(' ');
  const known = page.getByRole('button', { name: new RegExp(`${code}.*Is it there`) });
  if (await known.isVisible()) await known.click();
  else {
    await page.getByRole('button', { name: /Enter (a|another) code/ }).click();
    for (const sign of code)
      await page
        .locator('bay-code-pad')
        .getByRole('button', { name: new RegExp(`^${sign}`) })
        .click();
  }
  await page.getByRole('radio', { name: status }).click();
  await page.getByRole('button', { name: `Keep ${code}` }).click();
}

async function restoreAll(page: Page): Promise<void> {
  const open = page.locator('bay-restore-list button');
  for (let count = await open.count(); count > 0; count = await open.count()) {
    await tap(open.first());
    await expect.poll(async () => open.count()).toBeLessThan(count);
  }
  const back = page.getByRole('button', { name: /All is back/ });
  if (await back.isVisible()) await tap(back);
}

/** Takes the ramp that the bench offers, and says that the noise never stopped. */
export async function listenToTheBench(page: Page): Promise<void> {
  await page.getByRole('button', { name: 'Take a log of the scan tool instead' }).click();
  await page.getByRole('button', { name: /Take the bench's log/ }).click();
  await expect(page.getByText('421 samples')).toBeVisible();
  await tap(page.getByRole('button', { name: 'Take this series' }));
  await tap(page.getByRole('button', { name: 'It never stopped' }));
  await tap(page.getByRole('button', { name: 'Sure? It never stopped' }));
}
