import { ChangeDetectionStrategy, Component, model } from '@angular/core';
import type { ThemeName } from '../core/theme';

/** The three themes side by side. */
@Component({
  selector: 'bay-theme-switch',
  template: `
    <fieldset>
      <legend>Light</legend>
      <div class="row">
        @for (choice of choices; track choice.name) {
          <label [class.chosen]="theme() === choice.name">
            <input
              type="radio"
              name="theme"
              class="visually-hidden"
              [value]="choice.name"
              [checked]="theme() === choice.name"
              (change)="theme.set(choice.name)"
            />
            {{ choice.words }}
          </label>
        }
      </div>
    </fieldset>
  `,
  styles: `
    legend {
      margin-bottom: 8px;
    }
    .row {
      display: grid;
      grid-template-columns: repeat(3, 1fr);
      gap: 8px;
    }
    label {
      display: grid;
      place-items: center;
      min-height: 60px;
      padding: 4px 14px;
      border: 2px solid var(--edge);
      border-radius: var(--r);
      background: var(--sheet);
      font-weight: 600;
      cursor: pointer;
    }
    label.chosen {
      background: var(--action);
      border-color: var(--action);
      color: var(--on-action);
    }
    label:focus-within {
      outline: 3px solid var(--live);
      outline-offset: 3px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ThemeSwitch {
  readonly theme = model.required<ThemeName>();

  protected readonly choices: readonly { readonly name: ThemeName; readonly words: string }[] = [
    { name: 'day', words: 'Day' },
    { name: 'night', words: 'Night' },
    { name: 'glare', words: 'Glare' },
  ];
}
