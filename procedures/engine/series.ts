import { bytesToUtf8, utf8ToBytes } from '@noble/hashes/utils';

/**
 * A logged series: one time axis, channels beside it. What is not known at a time is undefined.
 * Times are seconds from 0, rising.
 */
export interface Series {
  readonly timeS: readonly number[];
  readonly channels: readonly SeriesChannel[];
}

export interface SeriesChannel {
  readonly name: 'gauge' | 'manifold' | 'boost' | 'sound';
  readonly unit: string;
  readonly values: readonly (number | undefined)[];
}

const magic = 'BHS1';

/**
 * The series as bytes: `BHS1`, the head's length (uint32, little-endian), the head as JSON, then the columns as
 * little-endian float64, time first; a gap is NaN.
 */
export function encodeSeries(series: Series): Uint8Array {
  const head = utf8ToBytes(
    JSON.stringify({
      samples: series.timeS.length,
      channels: series.channels.map(({ name, unit }) => ({ name, unit })),
    }),
  );
  const columns = [series.timeS, ...series.channels.map((channel) => channel.values)];
  const bytes = new Uint8Array(8 + head.length + columns.length * series.timeS.length * 8);
  const view = new DataView(bytes.buffer);
  bytes.set(utf8ToBytes(magic), 0);
  view.setUint32(4, head.length, true);
  bytes.set(head, 8);
  let offset = 8 + head.length;
  for (const column of columns) {
    for (let i = 0; i < series.timeS.length; i += 1) {
      view.setFloat64(offset, column[i] ?? Number.NaN, true);
      offset += 8;
    }
  }
  return bytes;
}

/** The inverse of `encodeSeries`. Throws `RangeError` for bytes that are no series. */
export function decodeSeries(bytes: Uint8Array): Series {
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  if (bytes.length < 8 || bytesToUtf8(bytes.subarray(0, 4)) !== magic) {
    throw new RangeError('decodeSeries: these bytes are no series');
  }
  const headLength = view.getUint32(4, true);
  if (8 + headLength > bytes.length) throw new RangeError('decodeSeries: the head is cut off');
  const head = readHead(bytesToUtf8(bytes.subarray(8, 8 + headLength)));
  const start = 8 + headLength;
  const expected = start + (head.channels.length + 1) * head.samples * 8;
  if (bytes.length !== expected) {
    throw new RangeError(`decodeSeries: ${bytes.length} bytes where ${expected} belong`);
  }
  const column = (index: number): (number | undefined)[] =>
    Array.from({ length: head.samples }, (_, i) => {
      const value = view.getFloat64(start + (index * head.samples + i) * 8, true);
      return Number.isNaN(value) ? undefined : value;
    });
  return {
    timeS: column(0).map((time) => time ?? Number.NaN),
    channels: head.channels.map(({ name, unit }, index) => ({ name, unit, values: column(index + 1) })),
  };
}

interface SeriesHead {
  readonly samples: number;
  readonly channels: readonly Pick<SeriesChannel, 'name' | 'unit'>[];
}

function readHead(text: string): SeriesHead {
  let head: unknown;
  try {
    head = JSON.parse(text);
  } catch (error) {
    // JSON.parse throws SyntaxError on a damaged head.
    if (error instanceof SyntaxError) throw new RangeError('decodeSeries: the head is damaged');
    throw error;
  }
  if (!isHead(head)) throw new RangeError('decodeSeries: the head is damaged');
  return head;
}

function isHead(head: unknown): head is SeriesHead {
  if (typeof head !== 'object' || head === null) return false;
  const { samples, channels } = head as Record<string, unknown>;
  return (
    Number.isSafeInteger(samples) &&
    (samples as number) >= 0 &&
    Array.isArray(channels) &&
    channels.every(isChannelHead)
  );
}

function isChannelHead(channel: unknown): boolean {
  if (typeof channel !== 'object' || channel === null) return false;
  const { name, unit } = channel as Record<string, unknown>;
  return ['gauge', 'manifold', 'boost', 'sound'].includes(String(name)) && typeof unit === 'string';
}
