import {
  decodeSeries,
  encodeSeries,
  sha256Hex,
  type RunCommand,
  type Series,
} from '../../../../procedures/engine/showing';
import type { NewBlob } from '../../core/run-journal';

/** What the record of a series says beside its samples. */
export type SeriesFacts = Pick<
  Extract<RunCommand, { do: 'import-series' }>['record'],
  'channels' | 'source' | 'fileName' | 'skipped' | 'problems'
>;

/** A series made ready to be kept: the command that records it and the compressed bytes that it names by their hash. */
export async function packSeries(
  series: Series,
  facts: SeriesFacts,
): Promise<{ readonly command: Extract<RunCommand, { do: 'import-series' }>; readonly blob: NewBlob }> {
  const bytes = await through(encodeSeries(series), new CompressionStream('gzip'));
  const sha256 = sha256Hex(bytes);
  return {
    command: {
      do: 'import-series',
      series,
      record: {
        sha256,
        bytes: bytes.length,
        samples: series.timeS.length,
        durationS: (series.timeS.at(-1) ?? 0) - (series.timeS[0] ?? 0),
        ...facts,
      },
    },
    blob: { sha256, bytes, mediaType: 'application/gzip' },
  };
}

/** The inverse: a series from its stored bytes. Throws `RangeError` for bytes that hold none. */
export async function unpackSeries(bytes: Uint8Array): Promise<Series> {
  return decodeSeries(await through(bytes, new DecompressionStream('gzip')));
}

async function through(bytes: Uint8Array, transform: CompressionStream | DecompressionStream): Promise<Uint8Array> {
  const stream = new Blob([new Uint8Array(bytes)]).stream().pipeThrough(transform);
  return new Uint8Array(await new Response(stream).arrayBuffer());
}
