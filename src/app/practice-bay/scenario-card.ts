import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import type { OfferedScenario } from './practice-book';

/** A car to practise on: what the driver says, and how often it was tried. */
@Component({
  selector: 'bay-scenario-card',
  template: `
    <article [class.next]="isNext()">
      <h3>{{ offer().scenario.title }}</h3>
      <p class="story">{{ offer().scenario.story }}</p>
      <p class="meta">
        <span class="chip">{{ offer().scenario.half }} half</span>
        <span>{{ offer().scenario.visit.car }}</span>
        <span class="muted">{{ tries() }}</span>
      </p>
      <button
        type="button"
        [class]="isNext() ? 'primary' : 'plain'"
        [disabled]="isBusy() || !offer().procedure"
        (click)="started.emit()"
      >
        {{ isStarting() ? 'Opening' : offer().tries > 0 ? 'Try again' : 'Start' }}
        <span class="visually-hidden">{{ offer().scenario.title }}</span>
      </button>
    </article>
  `,
  styles: `
    article {
      display: grid;
      gap: 12px;
      padding: 20px;
      border: var(--rule-width) solid var(--rule);
      border-radius: 12px;
      background: var(--sheet);
    }
    article.next {
      border-color: var(--action);
    }
    h3 {
      font-size: 22px;
      font-weight: 600;
      line-height: 1.2;
    }
    .story {
      font-size: 19px;
      text-wrap: balance;
    }
    .meta {
      display: flex;
      flex-wrap: wrap;
      gap: 6px 14px;
      align-items: center;
      color: var(--ink-2);
    }
    .chip {
      color: var(--ink);
    }
    button {
      gap: 0;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ScenarioCard {
  readonly offer = input.required<OfferedScenario>();
  /** Whether it is the one to take next. */
  readonly isNext = input(false);
  readonly isBusy = input(false);
  readonly isStarting = input(false);

  readonly started = output<void>();

  protected readonly tries = computed(() => {
    const { tries, found } = this.offer();
    if (tries === 0) return 'not tried yet';
    return `${tries === 1 ? 'tried once' : `tried ${tries} times`}, ${found === 0 ? 'not found yet' : `found ${found === 1 ? 'once' : `${found} times`}`}`;
  });
}
