import { createHash } from 'node:crypto';
import { photoOf } from './photo-load';

const bytes = new Uint8Array([0xff, 0xd8, 0xff, 1]);
const sha256 = createHash('sha256').update(bytes).digest('hex');

describe('a photo of a record', () => {
  const made: Blob[] = [];
  beforeEach(() => {
    made.length = 0;
    // jsdom makes no addresses of bytes.
    URL.createObjectURL = (blob: Blob) => `blob:${made.push(blob)}`;
  });

  it('is shown when its bytes are those that the record names', () => {
    expect(photoOf(bytes, sha256, 'image/jpeg')).toEqual({ status: 'there', url: 'blob:1' });
    expect([made[0]?.type, made[0]?.size]).toEqual(['image/jpeg', 4]);
  });

  it('is not shown when they are others, or of a kind that may do more than show', () => {
    expect(photoOf(new Uint8Array([1]), sha256, 'image/jpeg')).toMatchObject({ status: 'failed' });
    expect(photoOf(bytes, sha256, 'image/svg+xml')).toMatchObject({ status: 'failed' });
    expect(made).toEqual([]);
  });
});
