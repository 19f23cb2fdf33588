import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { shownUnit, type DecisionInput } from '../../../procedures/engine/showing';
import type { WayLine } from './story-line';
import { isPlainWay } from './story-rows';

/** The way that was taken after a step: where it led and why, with the condition and its numbers on demand. */
@Component({
  selector: 'bay-way-taken',
  template: `
    @if (isPlain()) {
      <p class="because">{{ line().way.because }}</p>
    } @else {
      <p>
        <span class="to">{{ target() }}</span>
        <span class="because">{{ line().way.because }}</span>
      </p>
    }
    @if (line().way.reason; as reason) {
      <p class="because">Why: {{ reason }}</p>
    }
    @if (line().verdict; as step) {
      <p class="because">Heads for the finding: {{ step.title }}</p>
    }
    @if (line().insteadOf; as words) {
      <p class="instead">Chosen by hand; the record led to {{ words }}</p>
    }
    @if (line().way.when; as when) {
      <details>
        <summary>How it was decided</summary>
        <code>{{ when }}</code>
        @if (inputs().length > 0) {
          <dl>
            @for (entry of inputs(); track entry.name) {
              <dt>{{ entry.label }}</dt>
              <dd class="num">{{ entry.text }}</dd>
            }
          </dl>
        }
      </details>
    }
  `,
  styleUrl: './way-taken.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class WayTaken {
  readonly line = input.required<WayLine>();

  protected readonly isPlain = computed(() => isPlainWay(this.line()));
  protected readonly target = computed(() => {
    const { to, way } = this.line();
    if (to === undefined) return `Went on to ${way.to}`;
    return to.kind === 'finding' ? `Came to the finding: ${to.title}` : `Went on to ${to.number}, ${to.title}`;
  });
  protected readonly inputs = computed(() =>
    this.line().way.inputs.map((entry) => ({ name: entry.name, label: entry.label, text: inputText(entry) })),
  );
}

function inputText({ text, unit, uncertainty }: DecisionInput): string {
  const spread = uncertainty === undefined || uncertainty === '0' ? '' : ` ± ${uncertainty}`;
  return `${text}${spread} ${unit === undefined ? '' : shownUnit(unit)}`.trim();
}
