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
      <li>
        <button
          type="button"
          class="step"
          id="outline-"
          [class.current]="selected() === ''"
          [attr.aria-current]="selected() === '' ? 'step' : null"
          [attr.tabindex]="selected() === '' ? 0 : -1"
          (click)="selectedChange.emit('')"
          (keydown)="move($event, -1)"
        >
          <b></b>
          <svg viewBox="0 0 22 22" aria-hidden="true"><path d="M5 3h9l4 4v12H5zM8 10h6M8 14h6" /></svg>
          <span>What it is for</span>
        </button>
      </li>
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
  /** The id of the step that is read now; empty for what stands before the steps. */
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
    const target = { ArrowDown: index + 1, ArrowUp: index - 1, Home: -1, End: last }[event.key];
    if (target === undefined) return;
    event.preventDefault();
    const id = this.entries()[Math.min(last, target)]?.step.id ?? '';
    this.selectedChange.emit(id);
    document.getElementById(`outline-${id}`)?.focus();
  }
}
