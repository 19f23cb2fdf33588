import { acknowledge, shownStep, tap, walkTo, type Answers } from './support/at-the-car';
import { expect, test } from './support/test';
import { openVisit, signIn } from './support/visits';
import { eventsOnTablet } from './support/what-is-kept';

const coldCar: Answers = {
  gear: { gauge: 'G-12', scanTool: 'S-3', probe: 'L-2', barometer: 'B-1', thermometer: 'T-4' },
  read: { '2e': ['14', '13'], '4': ['1014'], '5': ['94.2'], '6': ['93.9'] },
  way: { '4': 'Altimeter setting' },
  codes: { '3': ['P0068 stored'] },
};

/** A point or a mark of the ramp. */
interface Tapped {
  readonly type: string;
  readonly data: { readonly text?: string; readonly mark?: string; readonly timeS?: number };
}

test('a mark within a tenth of a second of a point is kept at its moment, quick points too, and no button flickers', async ({
  page,
}) => {
  test.setTimeout(120_000);
  await signIn(page, 'okafor');
  await openVisit(page, {
    VIN: '1ZZBT4CK4LR204817',
    Make: 'Merrow',
    Model: 'Heron',
    'Repair order (RO)': '4492',
    Odometer: '84211',
    "Concern, in the customer's words": 'Whistle at idle',
  });
  await page.getByRole('button', { name: 'Keep the visit' }).click();
  await page.getByRole('button', { name: /Start the cold half/ }).click();
  await walkTo(page, '11', coldCar);
  await acknowledge(page, (await shownStep(page)).cautions?.length ?? 0);
  await tap(page.getByRole('button', { name: /Gauge at zero/ }));
  await expect(page.getByRole('button', { name: '+ 0.5', exact: true })).toBeVisible();
  const runId = new URL(page.url()).pathname.split('/').at(-1) ?? '';
  const before = (await eventsOnTablet(page, runId)).length;
  await page.waitForTimeout(1000);

  // Taps by the page's own clock: what drives the browser is not quick enough.
  const taps = await page.evaluate(async () => {
    const side = document.querySelector('bay-hand-side');
    let disabled = 0;
    const watch = new MutationObserver((changes) => {
      disabled += changes.filter(({ target }) => (target as Element).hasAttribute('disabled')).length;
    });
    if (side === null) throw new Error('there is no hand side');
    watch.observe(side, { attributes: true, attributeFilter: ['disabled'], subtree: true });
    const press = (name: string): number => {
      const button = [...side.querySelectorAll('button')].find(
        ({ textContent }) => textContent?.replace(/\s+/g, ' ').trim() === name,
      );
      if (button === undefined) throw new Error(`there is no button ${name}`);
      button.click();
      return performance.now();
    };
    const wait = (ms: number) => new Promise((resolve) => setTimeout(resolve, ms));
    const at = [press('+ 0.5')];
    await wait(80);
    at.push(press('The noise begins'));
    for (let times = 0; times < 4; times += 1) {
      await wait(250);
      at.push(press('+ 0.5'));
    }
    await wait(80);
    at.push(press('The noise stopped'));
    await wait(1000);
    watch.disconnect();
    return { at, disabled };
  });

  expect(taps.disabled).toBe(0);
  const tapped = (await eventsOnTablet(page, runId)).slice(before) as unknown as readonly Tapped[];
  const marks = tapped.filter(({ type }) => type === 'mark-placed').map(({ data }) => data.mark);
  expect(marks).toEqual(['noise-begins', 'noise-stops']);
  expect(tapped.filter(({ type }) => type === 'reading-recorded')).toHaveLength(5);
  const times = tapped.map(({ data }) => data.timeS ?? Number.NaN);
  const since = taps.at.map((ms) => (ms - (taps.at[0] ?? 0)) / 1000);
  for (const [index, timeS] of times.entries()) {
    // To a tenth of a second, as they are kept, and the page's own turn.
    expect(Math.abs(timeS - (times[0] ?? 0) - (since[index] ?? 0))).toBeLessThan(0.16);
  }
});
