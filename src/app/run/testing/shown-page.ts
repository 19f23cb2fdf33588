import type { ComponentFixture } from '@angular/core/testing';

/** The rendered element of a fixture. */
export const elementOf = (fixture: ComponentFixture<unknown>): HTMLElement => fixture.nativeElement as HTMLElement;

/** A button, or a tile that acts as one, by the name that is heard: its label, else its text. Throws when there is none. */
export function buttonNamed(fixture: ComponentFixture<unknown>, name: string): HTMLButtonElement {
  const found = [...elementOf(fixture).querySelectorAll('button')].find(
    (button) => (button.getAttribute('aria-label') ?? tidy(button.textContent)) === name,
  );
  if (found === undefined) throw new Error(`there is no button ${name}`);
  return found;
}

/** Whether there is such a button. */
export function hasButton(fixture: ComponentFixture<unknown>, name: string): boolean {
  return [...elementOf(fixture).querySelectorAll('button')].some(
    (button) => (button.getAttribute('aria-label') ?? tidy(button.textContent)) === name,
  );
}

/** All text, piece by piece with one blank between. */
export function textOf(fixture: ComponentFixture<unknown>): string {
  const walker = document.createTreeWalker(elementOf(fixture), NodeFilter.SHOW_TEXT);
  const pieces: string[] = [];
  while (walker.nextNode()) pieces.push(tidy(walker.currentNode.textContent));
  return pieces.filter((piece) => piece !== '').join(' ');
}

const tidy = (text: string | null): string => (text ?? '').replace(/\s+/g, ' ').trim();
