/** What a band gauge shows, all figures in one unit, whichever it is. */
export interface GaugeFigures {
  readonly low?: number | undefined;
  readonly high?: number | undefined;
  readonly value?: number | undefined;
  /** Half the whisker's length; 0 or more. */
  readonly uncertainty: number;
}

/** Where things lie on the line, in pixels from the left. */
export interface GaugeLayout {
  readonly lineStart: number;
  readonly lineEnd: number;
  readonly low: number | undefined;
  readonly high: number | undefined;
  readonly value: number | undefined;
  readonly whiskerStart: number | undefined;
  readonly whiskerEnd: number | undefined;
  /** The value lies off the drawn line: the mark stands at its end and points on. */
  readonly beyond: 'left' | 'right' | undefined;
}

const margin = 24;
/** The part of the line that a two-ended band takes when the value lies near it, and the least that it is left. */
const bandShare = 0.5;
const leastBandShare = 0.26;

/** Lays a band and a value out on a line of the given width. A band may have one end only. */
export function layOutGauge(figures: GaugeFigures, widthPx: number): GaugeLayout {
  const { low, high, value, uncertainty } = figures;
  const lineStart = margin;
  const lineEnd = Math.max(margin + 1, widthPx - margin);
  const { from, to } = shownRange(figures);
  const at = (figure: number): number => lineStart + ((figure - from) / (to - from)) * (lineEnd - lineStart);
  const clamp = (x: number): number => Math.min(lineEnd, Math.max(lineStart, x));
  const beyond = value === undefined ? undefined : value > to ? 'right' : value < from ? 'left' : undefined;
  const isShown = value !== undefined && beyond === undefined;
  return {
    lineStart,
    lineEnd,
    low: low === undefined ? undefined : at(low),
    high: high === undefined ? undefined : at(high),
    value: value === undefined ? undefined : clamp(at(value)),
    whiskerStart: isShown ? clamp(at(value - uncertainty)) : undefined,
    whiskerEnd: isShown ? clamp(at(value + uncertainty)) : undefined,
    beyond,
  };
}

function shownRange({ low, high, value, uncertainty }: GaugeFigures): { from: number; to: number } {
  if (low !== undefined && high !== undefined) return twoEndedRange(low, high, value, uncertainty);
  const edge = low ?? high;
  if (edge === undefined) {
    const centre = value ?? 0;
    const reach = Math.max(uncertainty * 4, Math.abs(centre) * 0.05, 1e-9);
    return { from: centre - reach, to: centre + reach };
  }
  const reach = Math.max(
    uncertainty * 5,
    value === undefined ? 0 : Math.abs(value - edge) * 1.3,
    Math.abs(edge) * 0.02,
  );
  const far = reach > 0 ? reach : 1;
  return { from: edge - far, to: edge + far };
}

function twoEndedRange(
  low: number,
  high: number,
  value: number | undefined,
  uncertainty: number,
): { from: number; to: number } {
  const width = Math.max(high - low, uncertainty * 2, 1e-9);
  const beside = (width / bandShare - width) / 2;
  const farthest = width / leastBandShare - width - beside;
  if (value === undefined) return { from: low - beside, to: high + beside };
  const reachLeft = low - (value - uncertainty) + width * 0.1;
  const reachRight = value + uncertainty - high + width * 0.1;
  return {
    from: low - Math.min(farthest, Math.max(beside, reachLeft)),
    to: high + Math.min(farthest, Math.max(beside, reachRight)),
  };
}

/** Two centred texts, moved apart until they neither touch each other nor leave the drawing. */
export function placeEndTexts(
  low: { x: number; width: number } | undefined,
  high: { x: number; width: number } | undefined,
  widthPx: number,
): { low: number | undefined; high: number | undefined } {
  const inside = (x: number, width: number): number => Math.min(widthPx - width / 2, Math.max(width / 2, x));
  if (!low || !high) {
    return { low: low && inside(low.x, low.width), high: high && inside(high.x, high.width) };
  }
  const apart = (low.width + high.width) / 2 + 12;
  const middle = (low.x + high.x) / 2;
  const gap = Math.max(high.x - low.x, apart);
  let lowX = inside(middle - gap / 2, low.width);
  let highX = inside(middle + gap / 2, high.width);
  if (highX - lowX < apart) {
    if (lowX <= low.width / 2) highX = lowX + apart;
    else lowX = highX - apart;
  }
  return { low: lowX, high: highX };
}
