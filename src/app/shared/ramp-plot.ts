import {
  afterRenderEffect,
  ChangeDetectionStrategy,
  Component,
  computed,
  DestroyRef,
  type ElementRef,
  inject,
  input,
  signal,
  viewChild,
} from '@angular/core';
import type uPlot from 'uplot';
import type { Series } from '../../../procedures/engine/showing';
import { fetchPart } from '../core/fetch-part';
import { hostSize } from './element-size';
import { describeRamp } from './ramp-description';
import { risesAbove } from './ramp-rises';
import { plotData, plotOptions, type PlotColours, type PlotMark } from './ramp-plot-options';

/**
 * A logged series on one time axis: the pressures above, the sound's level below, with marks across both. The drawing
 * library comes lazily; the same facts stand as text for those who cannot see it.
 */
@Component({
  selector: 'bay-ramp-plot',
  template: `
    <div #place class="place" role="img" [attr.aria-label]="description()"></div>
    @if (!isDrawn()) {
      <p class="muted">Drawing {{ series().timeS.length }} samples</p>
    }
  `,
  styles: `
    :host {
      display: block;
      position: relative;
      min-height: 72px;
      min-width: 0;
      overflow: hidden;
    }
    .place {
      position: absolute;
      inset: 0;
    }
    p {
      padding: 14px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RampPlot {
  readonly series = input.required<Series>();
  /** Marks with the words beside them; `isMain` is drawn solid, the others dotted. */
  readonly marks = input<readonly PlotMark[]>([]);
  /**
   * The air of the place, kilopascals: absolute pressures are drawn as rises above it, on the gauge's own scale. As
   * they are where it is not known.
   */
  readonly stationKpa = input<number>();
  /** Channel name -> how it is called; the channel's own name where absent. */
  readonly names = input<Readonly<Record<string, string>>>({});

  private readonly place = viewChild.required<ElementRef<HTMLElement>>('place');

  private readonly drawn = computed(() => risesAbove(this.series(), this.stationKpa()));
  private readonly size = hostSize({ width: 600, height: 300 });
  private readonly library = signal<typeof uPlot | undefined>(undefined);
  private readonly theme = signal(0);
  private plot: uPlot | undefined;
  protected readonly isDrawn = computed(() => this.library() !== undefined);
  protected readonly description = computed(() => describeRamp(this.series(), this.marks(), this.names()));

  constructor() {
    void this.fetchLibrary();
    this.redrawOnThemeChange();
    // A canvas is outside Angular's templates: it is drawn anew when data, room or theme change.
    afterRenderEffect(() => this.draw());
    inject(DestroyRef).onDestroy(() => this.plot?.destroy());
  }

  /** Without it the same facts stand as text, and nothing is laid over the step because of a drawing. */
  private async fetchLibrary(): Promise<void> {
    const module = await fetchPart(() => import('uplot')).catch(() => undefined);
    this.library.set(module?.default);
  }

  private draw(): void {
    const Plot = this.library();
    this.theme();
    const { width, height } = this.size();
    const element = this.place().nativeElement;
    const options = plotOptions({
      series: this.drawn(),
      marks: this.marks(),
      names: this.names(),
      width,
      height: Math.max(height, 72),
      colours: coloursOf(element),
    });
    if (!Plot) return;
    this.plot?.destroy();
    this.plot = new Plot(options, plotData(this.drawn()), element);
  }

  private redrawOnThemeChange(): void {
    const observer = new MutationObserver(() => this.theme.update((count) => count + 1));
    observer.observe(document.documentElement, { attributes: true, attributeFilter: ['data-theme'] });
    inject(DestroyRef).onDestroy(() => observer.disconnect());
  }
}

function coloursOf(element: HTMLElement): PlotColours {
  const style = getComputedStyle(element);
  const role = (name: string): string => style.getPropertyValue(`--${name}`).trim() || '#000000';
  return {
    ink: role('ink'),
    ink2: role('ink-2'),
    rule: role('rule'),
    action: role('action'),
    live: role('live'),
    liveWash: role('live-wash'),
    sheet: role('sheet'),
  };
}
