import { library } from '../../../procedures/library';
import { placeLabels, type PlacedLabel } from './air-path-labels';
import { airPathParts } from './air-path-parts';

const drawing = { left: 10, top: 18, right: 700, bottom: 322 };
/** Room of the sheet on a tablet in landscape, in portrait, on a phone, and in a flat strip. */
const rooms = [
  { name: 'landscape', width: 630, height: 350 },
  { name: 'portrait', width: 750, height: 300 },
  { name: 'phone', width: 330, height: 220 },
  { name: 'strip', width: 600, height: 150 },
];

function viewOf(room: { width: number; height: number }) {
  const scale = Math.min(room.width / 690, room.height / 304);
  const spareX = (room.width / scale - 690) / 2;
  const spareY = (room.height / scale - 304) / 2;
  return {
    fontSize: (scale < 0.55 ? 15 : 18) / scale,
    view: {
      left: drawing.left - spareX,
      right: drawing.right + spareX,
      top: drawing.top - spareY,
      bottom: drawing.bottom + spareY,
    },
  };
}

function boxOf({ lines, x, y }: PlacedLabel, fontSize: number) {
  const width = Math.max(...lines.map((line) => line.length)) * fontSize * 0.58;
  const top = y - fontSize * 0.95;
  return { left: x - width / 2, right: x + width / 2, top, bottom: top + lines.length * fontSize * 1.2 };
}

const pictures = library.flatMap(({ id, steps }) =>
  steps.flatMap(({ number, picture }) =>
    picture?.sheet === 'air-path' && picture.labels
      ? [{ step: `${id} ${number}`, picture, labels: picture.labels }]
      : [],
  ),
);

describe('placeLabels', () => {
  it('has steps of the library to prove itself on', () => expect(pictures.length).toBeGreaterThan(10));

  it.each(rooms)('keeps every label of every step inside the $name and off the others', (room) => {
    const { fontSize, view } = viewOf(room);
    for (const { step, picture, labels } of pictures) {
      const placed = placeLabels(
        Object.entries(labels).map(([id, text]) => ({ id, text })),
        picture.marks,
        fontSize,
        view,
      );
      expect([step, placed.length]).toEqual([step, Object.keys(labels).length]);
      const boxes = placed.map((label) => boxOf(label, fontSize));
      for (const box of boxes) {
        expect(box.left).toBeGreaterThanOrEqual(view.left - 0.01);
        expect(box.right).toBeLessThanOrEqual(view.right + 0.01);
        expect(box.top).toBeGreaterThanOrEqual(view.top - 0.01);
        expect(box.bottom).toBeLessThanOrEqual(view.bottom + 0.01);
      }
      boxes.forEach((box, index) => {
        for (const other of boxes.slice(index + 1)) {
          const isApart =
            box.right <= other.left || other.right <= box.left || box.bottom <= other.top || other.bottom <= box.top;
          expect([step, isApart]).toEqual([step, true]);
        }
      });
    }
  });

  it('knows every part that a step of the library marks', () => {
    const known = new Set<string>(airPathParts.map(({ id }) => id));
    const marked = library.flatMap(({ steps }) =>
      steps.flatMap(({ picture }) => (picture?.sheet === 'air-path' ? picture.marks : [])),
    );
    expect(marked.filter((id) => !known.has(id))).toEqual([]);
  });
});
