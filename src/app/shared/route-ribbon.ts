import {
  afterRenderEffect,
  ChangeDetectionStrategy,
  Component,
  computed,
  type ElementRef,
  input,
  output,
  signal,
  viewChild,
} from '@angular/core';
import { hostSize } from './element-size';
import { ResultMark } from './result-mark';
import { resultWords, type ShownResult } from './result-words';

/** A step that was walked: its number as people say it, and how it came out. */
export interface WalkedBead {
  readonly label: string;
  /** `done` where nothing was judged. */
  readonly result?: ShownResult;
}

/** One possible way on. */
export interface WayAhead {
  readonly label: string;
  readonly isMain: boolean;
}

/**
 * The Route: one line along which the walked steps are beads with their results, the current one stands in copper,
 * and the possible ways ahead fan out and thin. A long way draws its beads together, then scrolls; the live bead and
 * the way ahead always stay in sight.
 */
@Component({
  selector: 'bay-route',
  imports: [ResultMark],
  templateUrl: './route-ribbon.html',
  styleUrl: './route-ribbon.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RouteRibbon {
  /** The walked steps in order, the current one left out. */
  readonly walked = input.required<readonly WalkedBead[]>();
  /** The current step's number; absent once a finding is reached. */
  readonly live = input<string>();
  /** Main way first. */
  readonly ahead = input<readonly WayAhead[]>([]);
  /** Whether a walked bead can be tapped to look back at its step. */
  readonly canLook = input(false);
  /** The place in `walked` of the bead that was tapped. */
  readonly beadAsked = output<number>();

  private readonly scroller = viewChild<ElementRef<HTMLElement>>('scroller');

  private readonly size = hostSize({ width: 1280, height: 88 });
  protected readonly hasEarlier = signal(false);
  protected readonly isScrollable = signal(false);
  protected readonly words = resultWords;
  protected readonly beads = computed(() =>
    this.walked().map(({ label, result }, index) => ({ label, result: result ?? 'done', index })),
  );
  protected readonly main = computed(() => this.ahead().find((way) => way.isMain) ?? this.ahead()[0]);
  /** What stands under the main way: the only other one, or how many others there are. */
  protected readonly others = computed(() => {
    const rest = this.ahead().filter((way) => way !== this.main());
    if (rest.length === 0) return undefined;
    const first = rest[0]?.label ?? '';
    return rest.length === 1 ? `or: ${first}` : `or: ${first}, and ${rest.length - 1} more`;
  });
  protected readonly spokenAhead = computed(() =>
    this.ahead()
      .map((way) => way.label)
      .join('; or: '),
  );

  constructor() {
    // Scrolling is the DOM's own state: whenever the way or the room changes, its newest end comes into sight.
    afterRenderEffect(() => {
      this.beads();
      this.size();
      const element = this.scroller()?.nativeElement;
      if (!element) return;
      element.scrollLeft = element.scrollWidth;
      this.isScrollable.set(element.scrollWidth > element.clientWidth + 1);
      this.hasEarlier.set(element.scrollLeft > 1);
    });
  }

  protected noteScroll(): void {
    const element = this.scroller()?.nativeElement;
    this.hasEarlier.set(element !== undefined && element.scrollLeft > 1);
  }
}
