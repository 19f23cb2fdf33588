import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import type { ProcedureDocument } from '../../../procedures/document';
import { KindGlyph } from './kind-glyph';
import { kindWords } from './kind-words';

/** A procedure's steps in reading order, with their kinds, what they open and close, and how many problems they have. */
@Component({
  selector: 'bay-outline',
  imports: [KindGlyph],
  template: `
    <ol>
      @for (entry of entries(); track entry.step.id) {
        <li>
          <button
            type="button"
            class="step"
            [id]="'outline-' + entry.step.id"
            [class.current]="entry.step.id === selected()"
            [attr.aria-current]="entry.step.id === selected() ? 'step' : null"
            [attr.tabindex]="entry.step.id === selected() ? 0 : -1"
            (click)="selectedChange.emit(entry.step.id)"
            (keydown)="move($event, $index)"
          >
            <b class="num">{{ entry.step.kind === 'finding' ? '' : entry.step.number }}</b>
            <bay-kind-glyph [kind]="entry.step.kind" />
            <span>
              <span class="visually-hidden">{{ words[entry.step.kind] }}: </span>{{ entry.step.title }}
            </span>
            @if (entry.problems > 0) {
              <i class="problems">{{ entry.problems }}<span class="visually-hidden"> problems</span></i>
            } @else if (entry.opens) {
              <i class="tie">opens</i>
            } @else if (entry.closes) {
              <i class="tie">closes</i>
            }
          </button>
        </li>
      }
    </ol>
  `,
  styleUrl: './outline.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Outline {
  readonly document = input.required<ProcedureDocument>();
  /** The step that is read now. */
  readonly selected = input.required<string>();
  /** Step id -> how many problems it has. */
  readonly problems = input<ReadonlyMap<string, number>>(new Map());

  readonly selectedChange = output<string>();

  protected readonly words = kindWords;
  protected readonly entries = computed(() =>
    this.document().steps.map((step) => ({
      step,
      problems: this.problems().get(step.id) ?? 0,
      opens: (step.disturbs ?? []).length > 0,
      closes: step.kind === 'restore',
    })),
  );

  /** One tab stop: arrows, Home and End go through the steps. */
  protected move(event: KeyboardEvent, index: number): void {
    const last = this.entries().length - 1;
    const target = { ArrowDown: index + 1, ArrowUp: index - 1, Home: 0, End: last }[event.key];
    const entry = target === undefined ? undefined : this.entries()[Math.min(last, Math.max(0, target))];
    if (entry === undefined) return;
    event.preventDefault();
    this.selectedChange.emit(entry.step.id);
    document.getElementById(`outline-${entry.step.id}`)?.focus();
  }
}
