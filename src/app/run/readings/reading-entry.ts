import { ChangeDetectionStrategy, Component, computed, effect, output, signal } from '@angular/core';
import type { UnitName } from '../../../../procedures/calculations/for-a-run';
import { previewBand, previewReading } from '../../../../procedures/engine';
import { parseDecimal, readsOf, shownUnit, takesNeeded, type NamedValue } from '../../../../procedures/engine/showing';
import { entryField } from '../entry-draft';
import { HandSide } from '../frame/hand-side';
import { WideSide } from '../frame/wide-side';
import { StepEntry } from '../step-entry';
import { meanAndSpread, readingBefore, takesOf } from './earlier-readings';
import { entryTarget } from './entry-target';
import { NumberPad } from './number-pad';
import { pressKey, shownFigure, type PadKey } from './number-text';
import { ReadingDisplay } from './reading-display';
import { WayTiles } from './way-tiles';

/**
 * Takes readings: one quantity after the other, each as often as the author asks. While it is typed the reading is
 * judged live, with its uncertainty, by the same function that will judge it for good.
 */
@Component({
  selector: 'bay-reading-entry',
  imports: [HandSide, NumberPad, ReadingDisplay, WayTiles, WideSide],
  templateUrl: './reading-entry.html',
  styleUrl: './reading-entry.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReadingEntry extends StepEntry<'reading' | 'wait' | 'hold'> {
  /** Where the step would lead if what is typed were recorded; undefined while that is not known. */
  readonly wouldGoTo = output<string | undefined>();

  /** What is read together: of a hold what it begins with, then what it ends with. */
  private readonly reads = computed(() => {
    const step = this.step();
    if (step.kind !== 'hold') return readsOf(step);
    return (this.run().state.current?.timer === undefined ? step.begins : step.ends) ?? [];
  });
  /** The quantity that is asked for now: the first that has not all its takes in this claim. */
  protected readonly quantity = computed(() => {
    const reads = this.reads();
    const missing = reads.find((read) => takesOf(this.run(), read.name).length < takesNeeded(read));
    // A wait that is not over yet takes its readings again, from the first one on.
    return missing ?? this.againFrom() ?? reads[0];
  });
  private readonly takes = computed(() => {
    const quantity = this.quantity();
    return quantity === undefined ? [] : takesOf(this.run(), quantity.name);
  });
  private readonly chosenWay = entryField(this.run, 'way', '');
  protected readonly wayId = computed(() => (this.chosenWay() === '' ? undefined : this.chosenWay()));
  protected readonly way = computed(() => this.quantity()?.ways?.find(({ id }) => id === this.wayId()));
  protected readonly target = computed(() => {
    const quantity = this.quantity();
    return quantity === undefined ? undefined : entryTarget(this.run().state, quantity, this.way());
  });
  /** What is typed. A new quantity, way or take begins empty; a refusal leaves it as it is. */
  protected readonly text = entryField(this.run, () => `figure ${this.wayId() ?? ''}`, '');
  private readonly attempted = signal('');

  protected readonly preview = computed(() => {
    const quantity = this.quantity();
    const target = this.target();
    if (quantity === undefined || target === undefined || parseDecimal(this.text()) === undefined) return undefined;
    const { procedure, state } = this.run();
    return previewReading(procedure, state, {
      name: quantity.name,
      text: this.text(),
      unit: target.unit,
      ...(this.wayId() === undefined ? {} : { way: this.wayId() }),
    });
  });
  protected readonly judged = computed<NamedValue | undefined>(() => {
    const preview = this.preview();
    if (preview?.ok === true && preview.value !== undefined) return preview.value;
    return undefined;
  });
  /** The refusal, as long as what was refused is still what is typed. */
  protected readonly refusal = computed(() =>
    this.problem() !== undefined && this.attempted() === this.text() ? this.problem()?.message : undefined,
  );
  protected readonly shown = computed(() => shownFigure(this.text()));
  protected readonly before = computed(() => {
    const quantity = this.quantity();
    if (quantity === undefined) return undefined;
    const last = this.takes().at(-1)?.text ?? readingBefore(this.run(), quantity.name);
    return last === undefined ? undefined : `before: ${shownFigure(last)}`;
  });
  protected readonly band = computed(() => {
    const quantity = this.quantity();
    return quantity === undefined ? undefined : previewBand(this.run().procedure, this.run().state, quantity);
  });
  protected readonly instrumentNote = computed(() => {
    const target = this.target();
    const instrument = target?.instrument;
    if (target === undefined || instrument === undefined) return undefined;
    return `${instrument.label}, steps of ${instrument.resolution} ${shownUnit(target.unit)}`;
  });
  protected readonly progress = computed(() => {
    const reads = this.reads();
    const quantity = this.quantity();
    if (quantity === undefined) return undefined;
    const needed = takesNeeded(quantity);
    const take = needed > 1 ? `take ${Math.min(this.takes().length + 1, needed)} of ${needed}` : undefined;
    const part = reads.length > 1 ? `${reads.indexOf(quantity) + 1} of ${reads.length}` : undefined;
    return [part, take, meanAndSpread(this.run(), quantity)].filter((words) => words !== undefined).join(', ');
  });
  protected readonly isLastTake = computed(() => {
    const preview = this.preview();
    return preview === undefined || !preview.ok || preview.way !== undefined;
  });
  protected readonly primaryLabel = computed(() => {
    const { kind } = this.step();
    // What a hold begins with is followed by its clock, and a wait may have to be read again.
    const isFollowed = kind === 'hold' && this.run().state.current?.timer === undefined;
    if (kind === 'wait' || isFollowed) return 'Record';
    return this.isLastTake() ? 'Record\nand go on' : 'Record';
  });
  /** A wait that has all its readings and is not over: what there is to do meanwhile. */
  protected readonly meanwhile = computed(() => {
    const step = this.step();
    if (step.kind !== 'wait') return undefined;
    const isRead = step.reads.every(({ name }) => this.run().state.values[name]?.step === step.id);
    return isRead ? `Not yet. ${step.meanwhile}` : undefined;
  });

  /** What the key beside the digits does: with nothing typed it leads back to the ways, or undoes the last take. */
  protected readonly eraseLabel = computed(() => {
    if (this.text() !== '') return 'Erase';
    if (this.wayId() !== undefined) return 'Other way';
    // By its figure: in a wait the quantity that is asked for again is not the one that was read last.
    const last = this.takes().at(-1)?.text;
    return last === undefined ? 'Erase' : `Undo ${shownFigure(last)}`;
  });

  constructor() {
    super();
    // Towards the Route: while a figure is typed it shows where that figure leads.
    effect(() => {
      const preview = this.preview();
      this.wouldGoTo.emit(preview?.ok === true ? preview.way?.to : undefined);
    });
  }

  protected press(key: PadKey): void {
    this.text.update((text) => pressKey(text, key));
  }

  protected erase(): void {
    const name = this.quantity()?.name;
    if (this.text() !== '') this.press('erase');
    else if (this.wayId() !== undefined) this.chosenWay.set('');
    else if (name !== undefined && this.takes().length > 0) {
      this.commanded.emit({ do: 'take-back', name, reason: 'taken back' });
    }
  }

  protected record(): void {
    const quantity = this.quantity();
    const target = this.target();
    if (quantity === undefined || target === undefined) return;
    this.attempted.set(this.text());
    this.send(quantity.name, this.text(), target.unit);
  }

  /** A way that asks for nothing is recorded by its tile, with the figure that it gives. */
  protected chooseWay(id: string): void {
    this.chosenWay.set(id);
    const quantity = this.quantity();
    if (quantity === undefined || this.way()?.entry !== undefined) return;
    const { procedure, state } = this.run();
    const take = { name: quantity.name, text: '0', unit: quantity.unit, way: id };
    const preview = previewReading(procedure, state, take);
    this.send(quantity.name, (preview.ok ? preview.value?.text : undefined) ?? '0', quantity.unit);
  }

  protected readonly unitOf = (unit: UnitName): string => shownUnit(unit);

  private againFrom() {
    const step = this.step();
    if (step.kind !== 'wait') return undefined;
    const counts = step.reads.map(({ name }) => takesOf(this.run(), name).length);
    return step.reads[counts.findIndex((count) => count === Math.min(...counts))];
  }

  private send(name: string, text: string, unit: UnitName): void {
    const way = this.wayId();
    this.commanded.emit({ do: 'record', name, text, unit, ...(way === undefined ? {} : { way }) });
  }
}
