import { closeSync, ftruncateSync, mkdtempSync, openSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { gzipSync } from 'node:zlib';
import type { Page } from '@playwright/test';
import { enter, shownStep, tap, walkTo, type Answers } from './support/at-the-car';
import { expect, test } from './support/test';
import { openVisit, signIn, signOut } from './support/visits';
import { eventsOnTablet } from './support/what-is-kept';

const ramps = join(__dirname, '../reference/ramps');

const coldCar: Answers = {
  gear: { gauge: 'G-12', scanTool: 'S-3', probe: 'L-2', barometer: 'B-1', thermometer: 'T-4' },
  read: { '2e': ['14', '13'], '4': ['1014'], '5': ['94.2'], '6': ['93.9'] },
  way: { '4': 'Altimeter setting' },
  codes: { '3': ['P0068 stored'] },
};

test('a wrong password is said beside the field, and the name stays', async ({ page }) => {
  await page.goto('/');
  await page.getByLabel('Name').fill('lindqvist');
  await page.getByLabel('Password', { exact: true }).fill('not-the-password');
  await page.getByRole('button', { name: 'Sign in' }).click();
  const password = page.getByRole('textbox', { name: 'Password' });
  await expect(password).toHaveAccessibleDescription('This name and password do not belong together.');
  await expect(password).toHaveAttribute('aria-invalid', 'true');
  await expect(password).toBeFocused();
  await expect(page.getByLabel('Name')).toHaveValue('lindqvist');
  await expect(page).toHaveURL(/\/sign-in$/);
});

test('a VIN whose check digit is wrong is said beside it, and what else was typed stays, also after loading again', async ({
  page,
}) => {
  const typed = {
    VIN: '1ZZBT4CK5LR204817',
    Make: 'Merrow',
    Model: 'Wren',
    'Repair order (RO)': '4482',
    Odometer: '90210',
    "Concern, in the customer's words": 'Whistle at idle',
  };
  await signIn(page, 'okafor');
  await openVisit(page, typed);
  await page.getByRole('button', { name: 'Keep the visit' }).click();

  const vin = page.getByRole('textbox', { name: 'VIN' });
  const isStillThere = async () => {
    await expect(vin).toHaveValue('1ZZ BT4CK5 LR204817');
    await expect(vin).toHaveAccessibleDescription(
      /The check digit does not fit: position 9 is 5, and the rest would make it 4\./,
    );
    for (const [label, text] of Object.entries(typed).slice(1)) {
      await expect(page.getByRole('textbox', { name: label })).toHaveValue(text);
    }
  };
  await isStillThere();
  await expect(vin).toHaveAccessibleDescription(/Look again, or keep it as it is\./);
  await expect(vin).toBeFocused();
  await expect(page).toHaveURL(/\/visit\/new$/);

  await page.reload();
  await isStillThere();
  await vin.fill('1ZZBT4CK4LR204817');
  await expect(vin).toHaveAccessibleDescription(/^check digit fits/);
  await page.getByRole('button', { name: 'Keep the visit' }).click();
  await expect(page.getByText('Procedures that fit')).toBeVisible();
});

test('a reading and a log that cannot be right are refused in words, and nothing of them is recorded', async ({
  page,
}) => {
  test.setTimeout(150_000);
  await signIn(page, 'okafor');
  await openVisit(page, {
    VIN: '1ZZBT4CK4LR204817',
    Make: 'Merrow',
    Model: 'Heron',
    'Repair order (RO)': '4483',
    Odometer: '84210',
    "Concern, in the customer's words": 'Whistle at idle',
    'Trouble codes': 'P0068',
  });
  await page.getByRole('button', { name: 'Add', exact: true }).click();
  await page.getByRole('button', { name: 'Keep the visit' }).click();
  await page.getByRole('button', { name: /Start the cold half/ }).click();
  await expect(page.locator('.frame h1').first()).toBeVisible();
  const runId = new URL(page.url()).pathname.split('/').at(-1) ?? '';
  const kept = () => eventsOnTablet(page, runId);

  await walkTo(page, '5', coldCar);
  await refuseReadings(page, kept);
  await walkTo(page, '11', { ...coldCar, read: { '6': ['93.9'] } });
  // The cautions stand before the entry.
  const cautions = (await shownStep(page)).cautions?.length ?? 0;
  for (let left = cautions; left > 0; left -= 1) await tap(page.getByRole('button', { name: 'I have read it' }));
  const folder = mkdtempSync(join(tmpdir(), 'bayhand-no-logs-'));
  try {
    await refuseFiles(page, folder, kept);
  } finally {
    rmSync(folder, { recursive: true });
  }
});

/** The run's events as the tablet holds them. */
type Kept = () => Promise<readonly Record<string, unknown>[]>;

async function refuseReadings(page: Page, kept: Kept): Promise<void> {
  const before = await kept();
  const figure = page.locator('bay-reading-display .figure .num');
  await page.keyboard.type('kPa e+x');
  await expect(figure).toHaveText('');
  await page.keyboard.type('9e9o9l9');
  await expect(figure).toHaveText('9999');

  await tap(page.locator('bay-number-pad .go'));
  await expect(page.locator('bay-reading-entry').getByRole('alert')).toHaveText(
    /^9999 kPa cannot be right: .*manifold.* lies between 5 and 350 kPa\. Read it again\.$/i,
  );
  await expect(figure).toHaveText('9999');
  expect((await shownStep(page)).number).toBe('5');
  expect(await kept()).toEqual(before);

  for (let left = 4; left > 0; left -= 1) await page.locator('bay-number-pad .erase').click();
  await enter(page, '94.2');
  await expect.poll(async () => (await kept()).length).toBeGreaterThan(before.length);
}

async function refuseFiles(page: Page, folder: string, kept: Kept): Promise<void> {
  // It is there once the last caution is written.
  await page.getByRole('button', { name: 'Take a log of the scan tool instead' }).click();
  const before = await kept();
  const taking = page.locator('bay-file-taking');
  const files: readonly (readonly [name: string, bytes: string | Buffer | number, says: RegExp])[] = [
    [
      'no-time.csv',
      'MAP (kPa),IAT (degC)\n93.9,24\n94.0,25\n',
      /^no-time\.csv cannot be used: no column holds the time\. /,
    ],
    ['empty.csv', '', /^empty\.csv is empty\. Save the log on the scan tool again/],
    ['endless.csv', 200 * 1024 * 1024, /^endless\.csv has 200 MB; a log of a ramp has less than 20 MB\. /],
    [
      'packed.csv',
      gzipSync(readFileSync(join(ramps, 'demo-warm-seals.csv'))),
      /^packed\.csv cannot be used: the file is not text\. Save the log as text with a column of time\.$/,
    ],
  ];
  for (const [name, content, says] of files) {
    await taking.locator('input[type=file]').setInputFiles(written(join(folder, name), content));
    await expect(taking.getByRole('alert')).toHaveText(says);
    await expect(taking.getByRole('button', { name: 'Take this series' })).toBeHidden();
  }
  expect(await kept()).toEqual(before);
  expect((await shownStep(page)).number).toBe('11');

  // Loaded again it is the same step, and a log that is right is taken as ever.
  await page.reload();
  await tap(page.getByRole('button', { name: /Go on with step 11/ }));
  await page.getByRole('button', { name: 'Take a log of the scan tool instead' }).click();
  await taking.locator('input[type=file]').setInputFiles(join(ramps, 'demo-cold-never-seals.csv'));
  await expect(taking.getByText('421 samples')).toBeVisible();
  await expect(taking.getByRole('alert')).toBeHidden();
}

/** Writes a file; a number makes it that many bytes long without any on the disk. */
function written(path: string, content: string | Buffer | number): string {
  if (typeof content !== 'number') writeFileSync(path, content);
  else {
    const file = openSync(path, 'w');
    ftruncateSync(file, content);
    closeSync(file);
  }
  return path;
}

test('who may not enter a room is told so on the screen, and by the server as well', async ({ page, request }) => {
  for (const [name, displayName, room] of [
    ['okafor', 'I. Okafor', '/method'],
    ['brandt', 'T. Brandt', '/records'],
  ] as const) {
    await signIn(page, name);
    await page.goto(room);
    await expect(page).toHaveURL(/\/not-yours$/);
    await expect(page.getByRole('heading', { name: 'This room is not yours' })).toBeVisible();
    await expect(page.getByText('Your role has no key to it. A lead or a manager can open it for you.')).toBeVisible();
    await page.getByRole('link', { name: 'Back to the Bench' }).click();
    await signOut(page, displayName);
  }

  const asked = async (name: string, method: string, path: string, data?: object) => {
    const signedIn = await request.post('/api/session', { data: { name, password: 'ossenholt-demo' } });
    const { accessToken } = (await signedIn.json()) as { accessToken: string };
    const headers = { authorization: `Bearer ${accessToken}` };
    return request.fetch(path, { method, headers, ...(data === undefined ? {} : { data }) });
  };
  for (const answer of [
    await asked('okafor', 'POST', '/api/procedures/drafts', { id: 'crankcase-valve-seal' }),
    await asked('okafor', 'POST', '/api/procedures/drafts/0193b0a0-0002-7000-8000-00000000d001/publication', {}),
    await asked('brandt', 'GET', '/api/records'),
  ]) {
    expect(answer.status()).toBe(403);
    expect(answer.headers()['content-type']).toMatch(/^application\/problem\+json/);
    expect(await answer.json()).toMatchObject({ status: 403, code: expect.any(String), detail: expect.any(String) });
  }
});
