import { decodeSeries, sha256Hex, type Series } from '../../../procedures/engine/showing';

/** The bytes are not those that the record names, or are no series. */
export class DamagedSeries extends Error {
  override readonly name = 'DamagedSeries';
}

/**
 * A series from its stored bytes: held against the hash that the record names, unpacked, decoded. Throws
 * `DamagedSeries`.
 */
export async function readSeries(bytes: Uint8Array, sha256: string): Promise<Series> {
  if (sha256Hex(bytes) !== sha256) {
    throw new DamagedSeries('The samples are not those that the record names: their hash differs.');
  }
  try {
    return decodeSeries(await gunzip(bytes));
  } catch (error) {
    // Unpacking fails for the bytes alone (each platform names that error in its own way), decoding with RangeError.
    throw new DamagedSeries('The samples cannot be read.', { cause: error });
  }
}

async function gunzip(bytes: Uint8Array): Promise<Uint8Array> {
  const packed = new Response(new Uint8Array(bytes)).body;
  if (packed === null) return new Uint8Array();
  const unpacked = packed.pipeThrough(new DecompressionStream('gzip'));
  return new Uint8Array(await new Response(unpacked).arrayBuffer());
}
