import { createHash } from 'node:crypto';
import { mostPhotoBytes, photoType, readPhoto } from './photo-file';

const jpeg = new Uint8Array([0xff, 0xd8, 0xff, 0xe0, 0, 16, 1, 2, 3]);
const ascii = (text: string): number[] => [...text].map((sign) => sign.charCodeAt(0));

/** The parts of a file that are read; jsdom's Blob cannot give its bytes. */
function fileOf(bytes: Uint8Array, size = bytes.length): Blob {
  return { size, arrayBuffer: () => Promise.resolve(bytes.buffer) } as unknown as Blob;
}

async function refusalOf(bytes: Uint8Array, size?: number): Promise<string> {
  const read = await readPhoto(fileOf(bytes, size));
  return read.ok ? 'taken' : read.message;
}

describe('a photo from the camera', () => {
  it('is kept byte for byte under its own hash', async () => {
    const sha256 = createHash('sha256').update(jpeg).digest('hex');
    expect(await readPhoto(fileOf(jpeg))).toEqual({
      ok: true,
      photo: {
        command: { do: 'attach-photo', sha256, bytes: 9, mediaType: 'image/jpeg' },
        blob: { sha256, bytes: jpeg, mediaType: 'image/jpeg' },
      },
    });
  });

  it.each([
    ['image/jpeg', [0xff, 0xd8, 0xff, 0xdb]],
    ['image/png', [0x89, ...ascii('PNG\r\n'), 0x1a, 0x0a]],
    ['image/webp', [...ascii('RIFF'), 1, 2, 3, 4, ...ascii('WEBP')]],
    ['image/heic', [0, 0, 0, 24, ...ascii('ftypheic')]],
    ['image/heic', [0, 0, 0, 24, ...ascii('ftypmif1')]],
    [undefined, [0, 0, 0, 24, ...ascii('ftypisom')]],
    [undefined, ascii('%PDF-1.7')],
    [undefined, []],
  ])('is told by its first bytes: %s', (type, bytes) => {
    expect(photoType(new Uint8Array(bytes))).toBe(type);
  });

  it('is refused in words where it cannot be shown, is none, or is too large', async () => {
    expect(await refusalOf(new Uint8Array([0, 0, 0, 24, ...ascii('ftypheic')]))).toContain('Set the camera to JPEG');
    expect(await refusalOf(new Uint8Array(ascii('a letter')))).toContain('is no photo');
    expect(await refusalOf(jpeg, mostPhotoBytes + 1024 * 1024)).toBe(
      'This photo has 17 MB; at most 16 MB can be kept. Take it again with a smaller picture size.',
    );
    expect(await refusalOf(jpeg, mostPhotoBytes)).toBe('taken');
  });
});
