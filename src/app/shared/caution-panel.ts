import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { Caution } from '../../../procedures/document';

/**
 * A caution as a signal word panel beside its text (ANSI Z535.4 and ISO 3864-2: danger white on red, warning black
 * on orange, caution black on yellow, each with the safety alert triangle; notice white on blue without it, since it
 * is about property alone).
 */
@Component({
  selector: 'bay-caution',
  template: `
    <div class="panel" [class]="word()" role="note" [attr.aria-label]="spokenWord()">
      <b>
        @if (word() !== 'notice') {
          <svg viewBox="0 0 28 26" width="28" height="26" aria-hidden="true">
            <path
              class="triangle"
              d="M14 1.5a2 2 0 0 1 1.75 1L27 22.3a2 2 0 0 1-1.75 3H2.75a2 2 0 0 1-1.75-3L12.25 2.5a2 2 0 0 1 1.75-1z"
            />
            <path class="bang" d="M14 9v7.5" />
            <circle class="dot" cx="14" cy="20.8" r="1.9" />
          </svg>
        }
        {{ shownWord() }}
      </b>
      <span>{{ text() }}</span>
    </div>
  `,
  styleUrl: './caution-panel.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CautionPanel {
  readonly word = input.required<Caution['word']>();
  /** The hazard, what it can do, how to avoid it. */
  readonly text = input.required<string>();

  /** Signal words are the one thing that is set in capitals, in the text itself, as the standards have it. */
  protected readonly shownWord = computed(() => this.word().toUpperCase());
  protected readonly spokenWord = computed(() => this.word().charAt(0).toUpperCase() + this.word().slice(1));
}
