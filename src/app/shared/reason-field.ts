import { ChangeDetectionStrategy, Component, input, model } from '@angular/core';

/** A reason: one of the usual ones by a tap, or in one's own words. */
@Component({
  selector: 'bay-reason-field',
  template: `
    <div class="tiles" role="group" [attr.aria-label]="label()">
      @for (usual of usuals(); track usual) {
        <button type="button" [class.chosen]="text() === usual" (click)="text.set(usual)">{{ usual }}</button>
      }
    </div>
    <div class="field">
      <label for="reason">{{ label() }}</label>
      <textarea
        #words
        id="reason"
        rows="2"
        [value]="text()"
        [attr.aria-invalid]="isRefused() ? 'true' : null"
        (input)="text.set(words.value)"
      ></textarea>
    </div>
  `,
  styles: `
    :host {
      display: grid;
      gap: 13px;
    }
    .tiles {
      display: grid;
      grid-template-columns: 1fr 1fr;
      gap: 13px;
    }
    .tiles button {
      min-height: var(--touch);
      padding: 4px 14px;
      font-weight: 500;
      line-height: 1.15;
    }
    .tiles .chosen {
      background: var(--action);
      border-color: var(--action);
      color: var(--on-action);
    }
    @media (max-width: 640px) {
      :host,
      .tiles {
        gap: 8px;
      }
      .tiles button {
        font-size: 16px;
        padding: 4px 8px;
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReasonField {
  readonly label = input.required<string>();
  /** The usual reasons. */
  readonly usuals = input.required<readonly string[]>();
  readonly text = model.required<string>();
  /** Whether it was refused; why is said over the primary action. */
  readonly isRefused = input(false);
}
