import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { ApiProblem } from '../core/api-problem';

/**
 * Why something that only the server has could not be shown, as a designed state: no network, not allowed, not there,
 * or failed. Each says what can be done.
 */
@Component({
  selector: 'bay-load-problem',
  template: `
    <div class="state" role="alert">
      <svg viewBox="0 0 48 48" width="56" height="56" aria-hidden="true" [class]="kind()">
        @switch (kind()) {
          @case ('unavailable') {
            <path d="M6 18a26 26 0 0 1 36 0M13 26a16 16 0 0 1 22 0M20 34a6 6 0 0 1 8 0M8 42L40 6" />
          }
          @case ('forbidden') {
            <rect x="10" y="22" width="28" height="20" rx="4" />
            <path d="M16 22v-6a8 8 0 0 1 16 0v6" />
          }
          @case ('missing') {
            <circle cx="21" cy="21" r="13" />
            <path d="M31 31l11 11M16 21h10" />
          }
          @default {
            <path d="M8 8h32v32H8zM17 17l14 14M31 17L17 31" />
          }
        }
      </svg>
      <h2>{{ words().title }}</h2>
      <p>{{ words().text }}</p>
      @if (detail(); as said) {
        <p class="muted">{{ said }}</p>
      }
      @if (words().canTryAgain) {
        <button type="button" class="plain" (click)="again.emit()">Try again</button>
      }
    </div>
  `,
  styles: `
    svg {
      fill: none;
      stroke: var(--ink-2);
      stroke-width: 3.5;
      stroke-linecap: round;
      stroke-linejoin: round;
    }
    svg.failed {
      stroke: var(--out);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LoadProblem {
  /** What could not be shown, as the subject of a sentence in the plural: `The records`. */
  readonly what = input.required<string>();
  /** What the loading failed with. */
  readonly problem = input.required<unknown>();

  /** The person wants to try again. */
  readonly again = output<void>();

  protected readonly kind = computed(() => kindOf(this.problem()));
  protected readonly words = computed(() => wordsFor(this.what())[this.kind()]);
  /** Only what says more than our own words. */
  protected readonly detail = computed(() => {
    const problem = this.problem();
    if (this.kind() !== 'failed' || !(problem instanceof Error)) return undefined;
    return problem instanceof ApiProblem ? `The server says: ${problem.message}` : problem.message;
  });
}

type Kind = 'unavailable' | 'forbidden' | 'missing' | 'failed';

function kindOf(problem: unknown): Kind {
  if (!(problem instanceof ApiProblem)) return 'failed';
  if (problem.isUnavailable) return 'unavailable';
  if (problem.status === 401 || problem.status === 403) return 'forbidden';
  return problem.status === 404 ? 'missing' : 'failed';
}

function wordsFor(what: string): Record<Kind, { title: string; text: string; canTryAgain: boolean }> {
  return {
    unavailable: {
      title: 'No network',
      text: `${what} are kept on the server and need a network. Everything on this tablet goes on working.`,
      canTryAgain: true,
    },
    forbidden: {
      title: 'Not yours to see',
      text: `${what} are for others to see. Ask the lead or the manager if you need them.`,
      canTryAgain: false,
    },
    missing: {
      title: 'Not found',
      text: `${what} are not on the server. The address may be mistyped, or the tablet has not sent them yet.`,
      canTryAgain: true,
    },
    failed: {
      title: 'That did not work',
      text: `${what} could not be shown. Nothing was changed.`,
      canTryAgain: true,
    },
  };
}
