import type { Page } from '@playwright/test';

/** What the watch saw: every screen of the run by its chip and sheet, and those on which practice could pass for work. */
export interface PracticeWatch {
  readonly screens: readonly string[];
  readonly unmarked: readonly string[];
}

interface Watching {
  practiceWatch?: { screens: Set<string>; unmarked: Set<string> };
}

/** Looks at the run's screen whenever anything on it changes, until the page is loaded anew. */
export async function watchPractice(page: Page): Promise<void> {
  await page.evaluate(() => {
    const seen = { screens: new Set<string>(), unmarked: new Set<string>() };
    (window as Watching).practiceWatch = seen;
    const look = () => {
      const frame = document.querySelector('.frame');
      if (frame === null) return;
      const chip = document.querySelector('bay-run-header .chip .wordy')?.textContent?.trim() ?? '';
      const over = frame.querySelector('bay-caution-gate, bay-sheet-hand, bay-stop-sheet')?.tagName.toLowerCase() ?? '';
      const screen = `${chip} ${over}`.trim();
      seen.screens.add(screen);
      const edge = getComputedStyle(frame);
      const isHatched =
        edge.borderImageSource.startsWith('repeating-linear-gradient') && parseFloat(edge.borderTopWidth) >= 5;
      if (!isHatched) seen.unmarked.add(`${screen}: no hatched edge`);
      const word = document.querySelector('bay-run-header .practice');
      const { x = 0, y = 0, width = 0, height = 0 } = word?.getBoundingClientRect() ?? {};
      // Whatever lies over the word would be what is found at its place.
      const isOnTop = word !== null && document.elementFromPoint(x + width / 2, y + height / 2) === word;
      if (!isOnTop || word.textContent?.trim() !== 'Practice') seen.unmarked.add(`${screen}: no word`);
    };
    new MutationObserver(look).observe(document.body, { subtree: true, childList: true, characterData: true });
    look();
  });
}

/** What was seen since the watch began. */
export async function practiceSeen(page: Page): Promise<PracticeWatch> {
  return page.evaluate(() => {
    const { practiceWatch: seen } = window as Watching;
    return { screens: [...(seen?.screens ?? [])], unmarked: [...(seen?.unmarked ?? ['nothing watched'])] };
  });
}
