import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import type { Hand } from '../../core/hand-setting';
import type { ThemeName } from '../../core/theme';
import { ThemeSwitch } from '../../shared/theme-switch';
import { PrimaryButton } from '../primary-action';
import type { RunPreferencesRow } from '../run-preferences';
import { SheetBody } from './sheet-body';
import { SheetHand } from './sheet-hand';

/** How the screens look and sound to this person, what is kept and sent, and the way to the Bench. */
@Component({
  selector: 'bay-view-sheet',
  imports: [PrimaryButton, SheetBody, SheetHand, ThemeSwitch],
  templateUrl: './view-sheet.html',
  styleUrl: './view-sheet.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ViewSheet {
  readonly preferences = input.required<RunPreferencesRow>();
  readonly theme = input.required<ThemeName>();
  readonly hand = input.required<Hand>();
  /** Where sending stands, in words. */
  readonly connection = input.required<string>();
  /** Whether the screen stays awake; undefined before it is known. */
  readonly isAwake = input<boolean>();
  readonly themeChosen = output<ThemeName>();
  readonly handChosen = output<Hand>();
  readonly changed = output<Partial<RunPreferencesRow>>();
  readonly gearAsked = output();
  readonly leftForBench = output();
  readonly left = output();
}
