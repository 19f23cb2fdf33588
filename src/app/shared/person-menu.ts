import {
  ChangeDetectionStrategy,
  Component,
  ElementRef,
  inject,
  input,
  output,
  signal,
  viewChild,
} from '@angular/core';
import { RouterLink } from '@angular/router';
import type { ThemeName } from '../core/theme';
import type { Person } from '../core/wire';
import { ThemeSwitch } from './theme-switch';

const roleWords: Readonly<Record<Person['role'], string>> = {
  technician: 'technician',
  lead: 'lead technician',
  apprentice: 'apprentice',
  manager: 'manager',
};

/** The person's name; opened, it holds the theme, the tablet's page and the way out. */
@Component({
  selector: 'bay-person-menu',
  imports: [RouterLink, ThemeSwitch],
  templateUrl: './person-menu.html',
  styleUrl: './person-menu.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { '(document:keydown.escape)': 'close()', '(document:pointerdown)': 'closeFromOutside($event)' },
})
export class PersonMenu {
  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;

  readonly person = input.required<Person>();
  readonly theme = input.required<ThemeName>();
  /** What waits on this tablet: signing out says that it stays. */
  readonly waiting = input(0);

  readonly themeChosen = output<ThemeName>();
  readonly signedOut = output();

  private readonly opener = viewChild.required<ElementRef<HTMLButtonElement>>('opener');

  protected readonly isOpen = signal(false);
  protected readonly roleWords = roleWords;

  protected toggle(): void {
    this.isOpen.update((isOpen) => !isOpen);
  }

  protected close(): void {
    if (!this.isOpen()) return;
    this.isOpen.set(false);
    this.opener().nativeElement.focus();
  }

  protected closeFromOutside(event: Event): void {
    if (event.target instanceof Node && !this.host.contains(event.target)) this.isOpen.set(false);
  }
}
