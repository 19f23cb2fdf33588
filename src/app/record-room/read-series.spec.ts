import { gzipSync } from 'node:zlib';
import { encodeSeries, sha256Hex, type Series } from '../../../procedures/engine';
import { DamagedSeries, readSeries } from './read-series';

const series: Series = {
  timeS: [0, 0.25, 0.5],
  channels: [{ name: 'gauge', unit: 'kPa', values: [0, 0.1, undefined] }],
};
const bytes = new Uint8Array(gzipSync(encodeSeries(series)));

describe('a series from its stored bytes', () => {
  it('comes back as it was kept, gaps included', async () => {
    await expect(readSeries(bytes, sha256Hex(bytes))).resolves.toEqual(series);
  });

  it('is refused when the bytes are not those that the record names', async () => {
    const changed = Uint8Array.from(bytes, (byte, index) => (index === bytes.length - 1 ? byte ^ 1 : byte));
    await expect(readSeries(changed, sha256Hex(bytes))).rejects.toThrow(DamagedSeries);
  });

  it('is refused when the bytes are no packed series', async () => {
    const strange = new TextEncoder().encode('no series at all');
    await expect(readSeries(strange, sha256Hex(strange))).rejects.toThrow('The samples cannot be read.');
  });
});
