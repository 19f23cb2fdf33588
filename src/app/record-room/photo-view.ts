import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { Step } from '../../../procedures/document';
import type { PhotoLoad } from './photo-load';
import type { PhotoLine } from './story-line';

/** A photo that was kept as evidence, with what it was to show; whole on demand. */
@Component({
  selector: 'bay-photo-view',
  template: `
    <figure>
      @if (load(); as load) {
        @switch (load.status) {
          @case ('there') {
            <a [href]="load.url" target="_blank"><img [src]="load.url" [alt]="'Photo: ' + title()" /></a>
          }
          @case ('loading') {
            <p class="muted" aria-busy="true">Fetching the photo, {{ size() }}</p>
          }
          @case ('missing') {
            <p class="muted">The photo is not here yet: the tablet that took it still holds it.</p>
          }
          @case ('failed') {
            <p class="error" role="alert">{{ load.why }}</p>
          }
        }
      }
      <figcaption>
        <b>Photo kept</b>, {{ size() }}.
        @if (shows().length > 0) {
          <span>It was to show: {{ shows().join(' ') }}</span>
        }
      </figcaption>
    </figure>
  `,
  styles: `
    figure {
      display: grid;
      justify-items: start;
      gap: 6px;
      margin: 0;
    }
    img {
      display: block;
      max-width: min(420px, 100%);
      max-height: 320px;
      border: var(--rule-width) solid var(--rule);
      border-radius: var(--r);
    }
    figcaption span {
      color: var(--ink-2);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PhotoView {
  readonly line = input.required<PhotoLine>();
  readonly step = input<Step>();
  readonly load = input<PhotoLoad>();

  protected readonly title = computed(() => this.step()?.title ?? 'a step');
  protected readonly size = computed(() => `${Math.ceil(this.line().record.bytes / 1000)} kB`);
  protected readonly shows = computed(() => {
    const step = this.step();
    return step?.kind === 'photo' ? step.shows : [];
  });
}
