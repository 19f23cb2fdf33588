import { join } from 'node:path';
import type { Page } from '@playwright/test';
import type { AxeResults, RunOptions } from 'axe-core';

/** Puts the accessibility checker on every page that is opened from now on; the pages' own policy lets no script in. */
export async function bringChecker(page: Page): Promise<void> {
  await page.addInitScript({ path: join(__dirname, '../../../node_modules/axe-core/axe.min.js') });
}

/** What breaks WCAG 2.x level A or AA on the page as it is: each rule with the elements; `rules` picks some alone. */
export async function violations(page: Page, rules?: readonly string[]): Promise<readonly string[]> {
  const options: RunOptions = {
    runOnly:
      rules === undefined
        ? { type: 'tag', values: ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa'] }
        : { type: 'rule', values: [...rules] },
  };
  const found = await page.evaluate(async (options) => {
    const { axe } = window as unknown as { axe: { run(of: Document, options: RunOptions): Promise<AxeResults> } };
    const { violations, passes } = await axe.run(document, options);
    return { violations, passes: passes.length };
  }, options);
  if (found.passes === 0) return ['nothing was checked'];
  return found.violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html).join(' | ')}`);
}

/**
 * What can be scrolled sideways, or lies beyond the screen's edge where nobody can tap or read it. `strips` are those
 * that scroll in themselves by design.
 */
export async function sideways(page: Page, strips?: string): Promise<readonly string[]> {
  return page.evaluate((strips) => {
    const root = document.documentElement;
    const found = root.scrollWidth > root.clientWidth ? [`the page: ${root.scrollWidth} of ${root.clientWidth}`] : [];
    for (const element of document.body.querySelectorAll<HTMLElement>('*')) {
      if (strips !== undefined && element.closest(strips) !== null) continue;
      const name = `${element.tagName.toLowerCase()}.${element.className}`;
      const { overflowX } = getComputedStyle(element);
      const isScroller = overflowX === 'auto' || overflowX === 'scroll';
      if (isScroller && element.scrollWidth > element.clientWidth + 1) found.push(`${name} scrolls`);
      const { left, right, width, height } = element.getBoundingClientRect();
      const isToBeSeen = element.matches('button, input, select, textarea, a, h1, h2, label') && width * height > 4;
      if (isToBeSeen && (left < -1 || right > innerWidth + 1)) found.push(`${name} lies at ${left} to ${right}`);
    }
    return found;
  }, strips);
}

/** Sizes in the millimetres that the look is drawn in. */
export interface MeasuredControls {
  readonly keys: readonly { readonly name: string; readonly widthMm: number; readonly heightMm: number }[];
  /** From the edge of *Stop* to the edge of the control that is nearest to it. */
  readonly nearestToStop: { readonly name: string; readonly mm: number };
}

/** Measures the number keys, and what lies round *Stop, supply off*. */
export async function measuredControls(page: Page): Promise<MeasuredControls> {
  return page.evaluate(() => {
    const mm = parseFloat(getComputedStyle(document.documentElement).getPropertyValue('--mm'));
    const nameOf = (element: Element): string =>
      element.getAttribute('aria-label') ?? element.textContent?.trim() ?? element.tagName;
    const keys = [...document.querySelectorAll('bay-number-pad .key')].map((key) => {
      const { width, height } = key.getBoundingClientRect();
      return { name: nameOf(key), widthMm: width / mm, heightMm: height / mm };
    });
    const stop = document.querySelector('bay-stop-row .stop');
    const from = stop?.getBoundingClientRect() ?? new DOMRect(NaN, NaN);
    let nearestToStop = { name: 'none', mm: Number.NaN };
    for (const control of document.querySelectorAll('button, a, input, select, textarea, [tabindex="0"]')) {
      const to = control.getBoundingClientRect();
      if (control === stop || to.width * to.height === 0) continue;
      const across = Math.max(to.left - from.right, from.left - to.right, 0);
      const along = Math.max(to.top - from.bottom, from.top - to.bottom, 0);
      const apart = Math.hypot(across, along) / mm;
      if (!(apart >= nearestToStop.mm)) nearestToStop = { name: nameOf(control), mm: apart };
    }
    return { keys, nearestToStop };
  });
}

/** Why nobody could tap *Stop, supply off* all over as it stands; empty when one of them can be. */
export async function troubleWithStop(page: Page): Promise<readonly string[]> {
  return page.evaluate(() => {
    const stops = [...document.querySelectorAll('button')].filter(
      (button) => button.textContent?.trim() === 'Stop, supply off',
    );
    const troubles = stops.map((stop) => {
      const { left, right, top, bottom, width, height } = stop.getBoundingClientRect();
      const box = `at ${left}, ${top} to ${right}, ${bottom}`;
      if (width * height === 0) return 'has no size';
      if (left < 0 || top < 0 || right > innerWidth || bottom > innerHeight) return `leaves the screen, ${box}`;
      for (const across of [0.03, 0.25, 0.5, 0.75, 0.97]) {
        for (const along of [0.08, 0.5, 0.92]) {
          const over = document.elementFromPoint(left + across * width, top + along * height);
          if (over === null || !stop.contains(over))
            return `lies under ${over?.outerHTML.slice(0, 80) ?? 'nothing'}, ${box}`;
        }
      }
      return undefined;
    });
    if (stops.length === 0) return ['is not there'];
    return troubles.includes(undefined) ? [] : troubles.filter((trouble) => trouble !== undefined);
  });
}
