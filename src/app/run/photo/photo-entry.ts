import {
  ChangeDetectionStrategy,
  Component,
  computed,
  DestroyRef,
  type ElementRef,
  inject,
  input,
  linkedSignal,
  output,
  signal,
  viewChild,
} from '@angular/core';
import { BigAction } from '../frame/big-action';
import { HandSide } from '../frame/hand-side';
import { WideSide } from '../frame/wide-side';
import { StepEntry } from '../step-entry';
import type { ShownPhoto } from './kept-photos';
import { readPhoto, type PhotoTaken } from './photo-file';

/**
 * A photo as evidence: taken with the tablet's camera, looked at beside what it must show, then kept. A photo that is
 * kept stays; another one may be added.
 */
@Component({
  selector: 'bay-photo-entry',
  imports: [BigAction, HandSide, WideSide],
  templateUrl: './photo-entry.html',
  styleUrl: './photo-entry.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PhotoEntry extends StepEntry<'photo'> {
  /** What was kept in this step. */
  readonly kept = input<readonly ShownPhoto[]>([]);
  readonly photoTaken = output<PhotoTaken>();

  private readonly camera = viewChild.required<ElementRef<HTMLInputElement>>('camera');
  private readonly reading = signal(0);

  /** A photo that was taken and not kept yet; keeping it ends that. */
  protected readonly taken = linkedSignal<number, { readonly photo: PhotoTaken; readonly url: string } | undefined>({
    source: () => this.run().state.seq,
    computation: () => undefined,
  });
  /** Why a file was not taken. */
  protected readonly refused = signal<string | undefined>(undefined);
  /** The one that is looked at: the new one, else the last that was kept. */
  protected readonly shown = computed(() => this.taken()?.url ?? this.kept().at(-1)?.url);
  protected readonly count = computed(() => this.run().state.photos[this.step().name]?.photos.length ?? 0);
  protected readonly refusal = computed(() => this.refused() ?? this.problem()?.message);

  private readonly urls: string[] = [];

  constructor() {
    super();
    inject(DestroyRef).onDestroy(() => this.urls.forEach((url) => URL.revokeObjectURL(url)));
  }

  protected take(): void {
    this.camera().nativeElement.click();
  }

  protected async look(): Promise<void> {
    const field = this.camera().nativeElement;
    const file = field.files?.[0];
    // The same photo again is a change too.
    field.value = '';
    if (file === undefined) return;
    const turn = this.reading() + 1;
    this.reading.set(turn);
    const read = await readPhoto(file);
    if (turn !== this.reading()) return;
    this.refused.set(read.ok ? undefined : read.message);
    if (!read.ok) return;
    const url = URL.createObjectURL(
      new Blob([new Uint8Array(read.photo.blob.bytes)], { type: read.photo.blob.mediaType }),
    );
    this.urls.push(url);
    this.taken.set({ photo: read.photo, url });
  }

  protected keep(): void {
    const taken = this.taken();
    if (taken !== undefined) this.photoTaken.emit(taken.photo);
  }
}
