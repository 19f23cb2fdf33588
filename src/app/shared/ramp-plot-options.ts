import type uPlot from 'uplot';
import type { Series } from '../../../procedures/engine/showing';

/** A mark on the time axis with the words beside it. */
export interface PlotMark {
  readonly label: string;
  readonly timeS: number;
  readonly isMain: boolean;
}

/** The theme's roles as the canvas needs them: resolved colours. */
export interface PlotColours {
  readonly ink: string;
  readonly ink2: string;
  readonly rule: string;
  readonly action: string;
  readonly live: string;
  readonly liveWash: string;
  readonly sheet: string;
}

export interface PlotRequest {
  readonly series: Series;
  readonly marks: readonly PlotMark[];
  readonly names: Readonly<Record<string, string>>;
  readonly width: number;
  readonly height: number;
  readonly colours: PlotColours;
}

const gapPx = 6;
/** Sizes of the drawing: with room, and on a phone where it is low. */
const roomySizes = {
  fontPx: 14,
  markPx: 15,
  columnPx: 74,
  timePx: 34,
  padding: [26, 8, 0, 14],
  rowPx: 20,
  spacePx: 30,
};
const lowSizes = { fontPx: 12, markPx: 13, columnPx: 58, timePx: 20, padding: [8, 6, 0, 8], rowPx: 15, spacePx: 18 };
/** Below this height it is drawn as a low one. */
const lowPx = 180;
/** The sound's share of the height, at the bottom. */
const soundShare = 0.32;
const dashes: readonly (readonly number[])[] = [[], [10, 6], [3, 4]];

/** The columns as uPlot takes them: time first; a gap is null. */
export function plotData(series: Series): uPlot.AlignedData {
  return [
    [...series.timeS],
    ...series.channels.map(({ values }) => values.map((value) => value ?? null)),
  ] as uPlot.AlignedData;
}

/** Pressures share one scale in the upper part of the drawing, the sound has its own in the lower part. */
export function plotOptions(request: PlotRequest): uPlot.Options {
  const { series, colours, names, width, height } = request;
  const hasSound = series.channels.some(({ name }) => name === 'sound');
  const hasPressure = series.channels.some(({ name }) => name !== 'sound');
  const pressureUnit = series.channels.find(({ name }) => name !== 'sound')?.unit ?? '';
  const pressureFloor = hasSound && hasPressure ? soundShare + 0.06 : 0;
  const soundCeiling = hasPressure ? soundShare : 1;
  let pressureIndex = 0;
  const sizes = sizesFor(height);
  const font = `500 ${sizes.fontPx}px Inter, sans-serif`;
  const sameColumn = { size: 0, gap: gapPx - sizes.columnPx };
  const axis = { stroke: colours.ink2, font, grid: { stroke: colours.rule, width: 1 }, ticks: { show: false } };
  return {
    width,
    height,
    padding: [...sizes.padding] as uPlot.Padding,
    legend: { show: false },
    cursor: { show: false },
    scales: {
      x: { time: false },
      pressure: { range: (_plot, low, high) => stretched(low, high, pressureFloor, 1) },
      sound: { range: (_plot, low, high) => stretched(low, high, 0, soundCeiling) },
    },
    axes: [
      {
        ...axis,
        grid: { show: false },
        size: sizes.timePx,
        values: (_plot, ticks) => ticks.map((tick, i) => (i === 0 ? `${tick} s` : String(tick))),
      },
      ...(hasPressure ? [sideAxis(axis, 'pressure', pressureUnit, extent(series, false), sizes)] : []),
      ...(hasSound
        ? // Its figures stand in the pressures' column, lower down: it takes no room of its own.
          [{ ...sideAxis(axis, 'sound', 'dB', extent(series, true), sizes), ...(hasPressure ? sameColumn : {}) }]
        : []),
    ],
    series: [
      {},
      ...series.channels.map(({ name }) => {
        const isSound = name === 'sound';
        const dash = isSound ? [] : [...(dashes[pressureIndex++ % dashes.length] ?? [])];
        return {
          label: names[name] ?? name,
          scale: isSound ? 'sound' : 'pressure',
          stroke: isSound ? colours.action : colours.ink,
          width: isSound ? 2 : 3,
          dash,
          points: { show: series.timeS.length < 40 },
        };
      }),
    ],
    hooks: {
      draw: [(plot: uPlot): void => drawMarks(plot, request)],
    },
  };
}

const sizesFor = (height: number): typeof roomySizes => (height < lowPx ? lowSizes : roomySizes);

/** The scale for which the data `low` to `high` fills the shares `from` to `to` of the height. */
function stretched(low: number | null, high: number | null, from: number, to: number): [number, number] {
  if (low === null || high === null) return [0, 1];
  const margin = Math.max((high - low) * 0.06, Math.abs(high) * 1e-3, 1e-6);
  const bottom = low - margin;
  const span = (high + margin - bottom) / (to - from);
  return [bottom - from * span, bottom - from * span + span];
}

function extent(series: Series, isSound: boolean): readonly [number, number] {
  let low = Infinity;
  let high = -Infinity;
  for (const { name, values } of series.channels) {
    if ((name === 'sound') !== isSound) continue;
    for (const value of values) {
      if (value === undefined) continue;
      if (value < low) low = value;
      if (value > high) high = value;
    }
  }
  return [low, high];
}

function sideAxis(
  axis: Pick<uPlot.Axis, 'stroke' | 'font' | 'grid' | 'ticks'>,
  scale: string,
  unit: string,
  [low, high]: readonly [number, number],
  { columnPx, spacePx }: typeof roomySizes,
): uPlot.Axis {
  const step = (high - low) / 20;
  // Ticks in the other scale's part of the height would say nothing.
  const inPart: uPlot.Axis.Filter = (_plot, ticks) =>
    ticks.map((tick) => (tick >= low - step && tick <= high + step ? tick : null));
  return {
    ...axis,
    grid: { ...axis.grid, filter: inPart },
    scale,
    side: 1,
    size: columnPx,
    gap: gapPx,
    space: spacePx,
    filter: inPart,
    values: (_plot, ticks) => {
      const last = ticks.findLastIndex((tick) => tick !== null);
      return ticks.map((tick, index) => (tick === null ? null : index === last ? `${tick} ${unit}` : String(tick)));
    },
  };
}

/** Marks are lines across both parts; each label takes the side with more room, one row lower than the one before. */
function drawMarks(plot: uPlot, { marks, colours, height }: PlotRequest): void {
  const { markPx, rowPx } = sizesFor(height);
  const { ctx, bbox } = plot;
  const ratio = devicePixelRatio;
  ctx.save();
  ctx.strokeStyle = colours.live;
  ctx.font = `700 ${markPx * ratio}px Inter, sans-serif`;
  ctx.textBaseline = 'bottom';
  [...marks]
    .sort((a, b) => a.timeS - b.timeS)
    .forEach((mark, index) => {
      const x = plot.valToPos(mark.timeS, 'x', true);
      ctx.lineWidth = (mark.isMain ? 3 : 2) * ratio;
      ctx.setLineDash(mark.isMain ? [] : [3 * ratio, 4 * ratio]);
      ctx.beginPath();
      ctx.moveTo(x, bbox.top);
      ctx.lineTo(x, bbox.top + bbox.height);
      ctx.stroke();
      ctx.setLineDash([]);
      const isLeft = x > bbox.left + bbox.width / 2;
      const room = ctx.measureText(mark.label).width;
      const y = bbox.top + ((index % 3) * rowPx + rowPx + 2) * ratio;
      const wished = isLeft ? x - 8 * ratio - room : x + 8 * ratio;
      const labelX = Math.max(bbox.left, Math.min(bbox.left + bbox.width - room, wished));
      ctx.lineWidth = 5 * ratio;
      ctx.strokeStyle = colours.sheet;
      ctx.lineJoin = 'round';
      ctx.strokeText(mark.label, labelX, y);
      ctx.fillStyle = colours.live;
      ctx.fillText(mark.label, labelX, y);
      ctx.strokeStyle = colours.live;
    });
  ctx.restore();
}
