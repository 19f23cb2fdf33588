import { airPathParts, type SheetPart } from './air-path-parts';

/** A label with its place in the sheet's units; `x`, `y` is the baseline's start, middle or end. */
export interface PlacedLabel {
  readonly id: string;
  readonly lines: readonly string[];
  readonly x: number;
  readonly y: number;
  readonly anchor: 'start' | 'middle' | 'end';
  /** From the label to the part, where the label does not stand right beside it. */
  readonly leader: { readonly x1: number; readonly y1: number; readonly x2: number; readonly y2: number } | undefined;
}

interface Box {
  readonly left: number;
  readonly top: number;
  readonly right: number;
  readonly bottom: number;
}

/** What of the sheet is in sight. */
export type SheetView = Box;

const lineHeight = 1.2;
/** Inter at weight 600: measured mean of lower-case words, with a little to spare. */
const characterWidth = 0.58;
const gap = 8;

/**
 * Places labels beside their parts so that none leaves the view and none lies on another label or on a marked part,
 * and as few as possible on other parts. `fontSize` is in the sheet's units, so that text can keep its size on the
 * screen while the sheet shrinks. The order of `labels` decides who chooses first.
 */
export function placeLabels(
  labels: readonly { readonly id: string; readonly text: string }[],
  marks: readonly string[],
  fontSize: number,
  view: SheetView,
): readonly PlacedLabel[] {
  const taken: Box[] = [];
  const placed: PlacedLabel[] = [];
  const marked = airPathParts.filter((part) => marks.includes(part.id)).map(boxOf);
  for (const { id, text } of labels) {
    const part = airPathParts.find((candidate) => candidate.id === id);
    if (!part) continue;
    const best = bestPlace(part, text, fontSize, view, taken, marked);
    taken.push(best.box);
    placed.push(best.label);
  }
  return placed;
}

interface Candidate {
  readonly label: PlacedLabel;
  readonly box: Box;
  readonly cost: number;
}

function bestPlace(
  part: SheetPart,
  text: string,
  fontSize: number,
  view: SheetView,
  taken: readonly Box[],
  marked: readonly Box[],
): Candidate {
  const candidates = wrappings(text, (view.right - view.left) * 0.94, fontSize).flatMap((lines, wraps) =>
    candidateBoxes(part, lines, fontSize, view).map((box, index) => {
      const label = labelIn(part, lines, fontSize, box);
      const cost =
        sum(othersThan(part).map((other) => overlap(leaderBox(label), other))) * 3 +
        sum(taken.map((other) => overlap(box, other))) * 1000 +
        sum(marked.map((other) => overlap(box, other))) * 20 +
        sum(airPathParts.map((other) => overlap(box, boxOf(other)))) +
        farness(distance(box, boxOf(part))) +
        wraps * 40 +
        index;
      return { box, cost, label };
    }),
  );
  return candidates.reduce((best, candidate) => (candidate.cost < best.cost ? candidate : best));
}

/** The text on one line where it fits, and broken into two near its middle. */
function wrappings(text: string, widest: number, fontSize: number): readonly (readonly string[])[] {
  const words = text.split(' ');
  const isTooWide = text.length * characterWidth * fontSize > widest;
  if (words.length < 2) return [[text]];
  const breaks = words
    .slice(1)
    .map((_, index) => [words.slice(0, index + 1).join(' '), words.slice(index + 1).join(' ')]);
  const even = breaks.reduce((best, pair) => (longest(pair) < longest(best) ? pair : best));
  return isTooWide ? [even] : [[text], even];
}

function candidateBoxes(part: SheetPart, lines: readonly string[], fontSize: number, view: SheetView): readonly Box[] {
  const width = longest(lines) * characterWidth * fontSize;
  const height = lines.length * lineHeight * fontSize;
  const target = boxOf(part);
  const middleX = (target.left + target.right) / 2;
  const middleY = (target.top + target.bottom) / 2;
  const rows = [target.top - gap - height, target.bottom + gap, middleY - height / 2];
  const columns = [
    middleX - width / 2,
    target.left,
    target.right - width,
    target.right + gap,
    target.left - gap - width,
  ];
  const near = [
    ...[rows[0], rows[1]].flatMap((top) => columns.slice(0, 3).map((left) => ({ left, top }))),
    ...columns.slice(3).map((left) => ({ left, top: rows[2] })),
  ];
  const far = [1.5, 3, 5].flatMap((steps) =>
    [target.top - gap - height * (1 + steps), target.bottom + gap + height * steps].flatMap((top) =>
      [middleX - width / 2, target.left - width * 0.4, target.right - width * 0.6].map((left) => ({ left, top })),
    ),
  );
  // Beside the drawing, where a wide place leaves room.
  const margins = [0, -1.5, 1.5].flatMap((steps) =>
    [view.left + 4, view.right - width - 4].map((left) => ({ left, top: middleY - height / 2 + steps * height })),
  );
  return [...near, ...far, ...margins].map(({ left = 0, top = 0 }) => inside({ left, top, width, height }, view));
}

function inside(box: { left: number; top: number; width: number; height: number }, view: SheetView): Box {
  const left = Math.max(view.left, Math.min(view.right - box.width, box.left));
  const top = Math.max(view.top, Math.min(view.bottom - box.height, box.top));
  return { left, top, right: left + box.width, bottom: top + box.height };
}

function labelIn(part: SheetPart, lines: readonly string[], fontSize: number, box: Box): PlacedLabel {
  const target = boxOf(part);
  const x = (box.left + box.right) / 2;
  const y = box.top + fontSize * 0.95;
  const away = distance(box, target);
  const leader =
    away > gap * 2.5
      ? {
          x1: clampTo(middle(target.left, target.right), box.left + 6, box.right - 6),
          y1:
            box.top > target.bottom
              ? box.top - 2
              : box.bottom <= target.top
                ? box.bottom + 2
                : middle(box.top, box.bottom),
          x2: middle(target.left, target.right),
          y2: box.top > target.bottom ? target.bottom + 2 : target.top - 2,
        }
      : undefined;
  return { id: part.id, lines, x, y, anchor: 'middle', leader };
}

/** A leader crosses what it runs over. */
function leaderBox({ leader }: PlacedLabel): Box {
  if (!leader) return { left: 0, top: 0, right: 0, bottom: 0 };
  const { x1, y1, x2, y2 } = leader;
  return { left: Math.min(x1, x2) - 2, right: Math.max(x1, x2) + 2, top: Math.min(y1, y2), bottom: Math.max(y1, y2) };
}

const othersThan = (part: SheetPart): readonly Box[] => airPathParts.filter((other) => other !== part).map(boxOf);
const sum = (figures: readonly number[]): number => figures.reduce((total, figure) => total + figure, 0);
const middle = (a: number, b: number): number => (a + b) / 2;
const clampTo = (x: number, low: number, high: number): number => Math.max(low, Math.min(high, x));
const longest = (lines: readonly string[]): number => Math.max(...lines.map((line) => line.length));
const boxOf = ({ box: [left, top, width, height] }: SheetPart): Box => ({
  left,
  top,
  right: left + width,
  bottom: top + height,
});
const overlap = (a: Box, b: Box): number =>
  Math.max(0, Math.min(a.right, b.right) - Math.max(a.left, b.left)) *
  Math.max(0, Math.min(a.bottom, b.bottom) - Math.max(a.top, b.top));
/** A label a little off is better than one on another part; a label far away is worse than both. */
const farness = (away: number): number => away * 6 + Math.max(0, away - 90) ** 2 * 0.15;
const distance = (a: Box, b: Box): number =>
  Math.hypot(Math.max(0, a.left - b.right, b.left - a.right), Math.max(0, a.top - b.bottom, b.top - a.bottom));
