import { DOCUMENT, effect, inject, Injectable, signal } from '@angular/core';
import { Session } from './session';
import { SettingsBook } from './settings-book';

/** Day is the default; night for under the bonnet; glare for the sun. */
export type ThemeName = 'day' | 'night' | 'glare';

export const themeNames: readonly ThemeName[] = ['day', 'night', 'glare'];

/** The theme of the person who works here. Each person's choice stays with them on this tablet. */
@Injectable({ providedIn: 'root' })
export class Theme {
  private readonly document = inject(DOCUMENT);
  private readonly settings = inject(SettingsBook);
  private readonly session = inject(Session);

  private readonly chosen = signal<ThemeName>('day');

  private recalling: Promise<void> = Promise.resolve();

  readonly name = this.chosen.asReadonly();

  constructor() {
    // The page itself carries the theme, and the browser's own bars their colour.
    effect(() => this.show(this.chosen()));
    effect(() => (this.recalling = this.recall(this.session.person()?.id)));
  }

  /** Resolves once the choice of the person at hand has been read. */
  recalled(): Promise<void> {
    return this.recalling;
  }

  /** Chooses a theme and keeps it for this person. */
  async choose(name: ThemeName): Promise<void> {
    this.chosen.set(name);
    await this.settings.write(keyOf(this.session.person()?.id), name);
  }

  private async recall(personId: string | undefined): Promise<void> {
    const name = await this.settings.read<ThemeName>(keyOf(personId));
    if (name !== undefined && themeNames.includes(name)) this.chosen.set(name);
  }

  private show(name: ThemeName): void {
    const root = this.document.documentElement;
    root.dataset['theme'] = name;
    const paper = getComputedStyle(root).getPropertyValue('--sheet').trim();
    const meta = this.document.querySelector('meta[name="theme-color"]');
    if (paper !== '') meta?.setAttribute('content', paper);
  }
}

const keyOf = (personId: string | undefined): string => `theme:${personId ?? 'nobody'}`;
