import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { placeLabels } from './air-path-labels';
import { airPathParts } from './air-path-parts';
import { hostSize } from './element-size';

/** The drawing's own bounds, with room for labels over the manifold and under the crankcase. */
const drawing = { left: 10, top: 18, right: 700, bottom: 322 };
const labelPx = 18;

/**
 * The sheet `air-path`: the air path of a turbo engine with its sensors, crankcase valves, regulator and listening
 * probe. A step marks parts by id and may put words beside them. It fills its host; texts keep their size.
 */
@Component({
  selector: 'bay-air-path',
  templateUrl: './air-path.html',
  styleUrl: './air-path.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AirPath {
  /** Ids of the parts that stand out; `airPathParts` lists them all. */
  readonly marks = input<readonly string[]>([]);
  /** Part id -> words beside it. */
  readonly labels = input<Readonly<Record<string, string>>>({});

  private readonly size = hostSize({ width: 676, height: 304 });
  /** What of the sheet is in sight: the drawing, widened or heightened to the host's own proportions. */
  private readonly view = computed(() => {
    const { width, height } = this.size();
    const across = drawing.right - drawing.left;
    const down = drawing.bottom - drawing.top;
    const scale = Math.min(width / across, Math.max(height, 1) / down);
    const spareX = (width / scale - across) / 2;
    const spareY = (Math.max(height, 1) / scale - down) / 2;
    return {
      scale,
      left: drawing.left - spareX,
      right: drawing.right + spareX,
      top: drawing.top - spareY,
      bottom: drawing.bottom + spareY,
    };
  });
  protected readonly viewBox = computed(() => {
    const { left, top, right, bottom } = this.view();
    return `${left} ${top} ${right - left} ${bottom - top}`;
  });
  /** Labels keep 18 px on the screen; on a very small sheet they give way to no less than 15 px. */
  protected readonly fontSize = computed(() => {
    const { scale } = this.view();
    return (scale < 0.55 ? 15 : labelPx) / scale;
  });
  protected readonly placed = computed(() =>
    placeLabels(
      Object.entries(this.labels()).map(([id, text]) => ({ id, text })),
      this.marks(),
      this.fontSize(),
      this.view(),
    ),
  );
  protected readonly on = computed<Readonly<Record<string, boolean>>>(() =>
    Object.fromEntries(airPathParts.map(({ id }) => [id, this.marks().includes(id)])),
  );
  protected readonly spoken = computed(() => {
    const labels = this.labels();
    const names = airPathParts
      .filter(({ id }) => this.marks().includes(id) || labels[id] !== undefined)
      .map(({ id, name }) => labels[id] ?? name);
    return names.length === 0
      ? 'Air path of a turbo engine'
      : `Air path of a turbo engine, marked: ${names.join(', ')}`;
  });
}
