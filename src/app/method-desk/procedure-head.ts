import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { shownUnit } from '../../../procedures/engine/showing';
import type { ProcedureDocument } from '../../../procedures/document';
import type { FileProblem } from './read-procedure-file';

/** What a procedure is for, what it needs, what holds throughout and how it is stopped, to be read before its steps. */
@Component({
  selector: 'bay-procedure-head',
  templateUrl: './procedure-head.html',
  styleUrl: './procedure-head.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ProcedureHead {
  readonly document = input.required<ProcedureDocument>();
  /** What must be mended in the document as a whole. */
  readonly problems = input<readonly FileProblem[]>([]);
  /** Finding's id -> the ids of the steps on one shortest way to it. */
  readonly ways = input<Readonly<Record<string, readonly string[]>>>({});

  /** The person wants to read a step. */
  readonly goTo = output<string>();

  /** Each finding with one shortest way to it. */
  protected readonly findings = computed(() => {
    const { steps } = this.document();
    const numbers = new Map(steps.map(({ id, number }) => [id, number]));
    return steps
      .filter(({ kind }) => kind === 'finding')
      .map(({ id, title }) => ({
        id,
        title,
        way: (this.ways()[id] ?? []).filter((step) => step !== id).map((step) => numbers.get(step) ?? step),
      }));
  });
  protected readonly facts = computed(() => {
    const { system, expectedMinutes, useLevel, pair, appliesTo } = this.document();
    return [
      { label: 'System', text: system },
      {
        label: 'Time',
        text: `about ${expectedMinutes} min${pair === true ? ' a half; run as a pair, cold and warm' : ''}`,
      },
      { label: 'Use', text: useLevel === 'every-step' ? 'every step is marked' : 'consulted' },
      { label: 'Codes', text: appliesTo.codes.join(', ') },
      { label: 'Seen as', text: appliesTo.symptoms.join('; ') },
      { label: 'Engine', text: appliesTo.engine.join('; ') },
    ].filter(({ text }) => text !== '');
  });
  protected readonly gear = computed(() =>
    this.document().gear.map(({ role, label, optional, shows }) => ({
      role,
      label,
      need: optional === true ? 'optional' : 'needed',
      shows:
        shows === undefined
          ? ''
          : `${shows.low} to ${shows.high} ${shownUnit(shows.unit)}, ${shows.resolution} ${shownUnit(shows.unit)} steps or finer`,
    })),
  );
  protected readonly inputs = computed(() =>
    this.document().inputs.map(({ name, label, unit, from, default: usual, source }) => ({
      name,
      label,
      text: from === 'default' ? `${usual ?? ''} ${shownUnit(unit)}`.trim() : origins[from],
      source,
    })),
  );
}

const origins = { 'site.elevation': 'from the site', 'visit.displacement': 'from the visit' } as const;
