import { sha256Hex, type RunCommand } from '../../../../procedures/engine/showing';
import type { NewBlob } from '../../core/run-journal';

/** The most that the server keeps of one photo, bytes. */
export const mostPhotoBytes = 16 * 1024 * 1024;

/** A photo that is to be kept with the step: the command that records it, and its bytes as the camera made them. */
export interface PhotoTaken {
  readonly command: Extract<RunCommand, { do: 'attach-photo' }>;
  readonly blob: NewBlob;
}

export type ReadPhoto =
  { readonly ok: true; readonly photo: PhotoTaken } | { readonly ok: false; readonly message: string };

/**
 * Reads a photo as the camera made it; nothing is changed in it. What it is is read from its first bytes, since a name
 * and a type say only what somebody called it.
 */
export async function readPhoto(file: Blob): Promise<ReadPhoto> {
  if (file.size > mostPhotoBytes) {
    return refuse(
      `This photo has ${megabytes(file.size)} MB; at most ${megabytes(mostPhotoBytes)} MB can be kept. Take it again with a smaller picture size.`,
    );
  }
  const bytes = new Uint8Array(await file.arrayBuffer());
  const mediaType = photoType(bytes);
  if (mediaType === 'image/heic') {
    return refuse(
      'This camera writes HEIC, which the Record room cannot show. Set the camera to JPEG, then take it again.',
    );
  }
  if (mediaType === undefined) return refuse('This file is no photo. Take one with the camera, or choose a JPEG.');
  const sha256 = sha256Hex(bytes);
  return {
    ok: true,
    photo: {
      command: { do: 'attach-photo', sha256, bytes: bytes.length, mediaType },
      blob: { sha256, bytes, mediaType },
    },
  };
}

/** What an image's first bytes say that it is; undefined where they say none of these. */
export function photoType(bytes: Uint8Array): 'image/jpeg' | 'image/png' | 'image/webp' | 'image/heic' | undefined {
  const text = (from: number, to: number): string => String.fromCharCode(...bytes.slice(from, to));
  if (bytes[0] === 0xff && bytes[1] === 0xd8 && bytes[2] === 0xff) return 'image/jpeg';
  if (text(0, 8) === '\u0089PNG\r\n\u001a\n') return 'image/png';
  if (text(0, 4) === 'RIFF' && text(8, 12) === 'WEBP') return 'image/webp';
  // ISO/IEC 23008-12: an ISO base media file whose brand is one of the HEIF image brands.
  if (text(4, 8) === 'ftyp' && /^(heic|heix|heim|heis|hevc|hevx|mif1|msf1)$/.test(text(8, 12))) return 'image/heic';
  return undefined;
}

const refuse = (message: string): ReadPhoto => ({ ok: false, message });

const megabytes = (bytes: number): string => (bytes / (1024 * 1024)).toFixed(bytes % (1024 * 1024) === 0 ? 0 : 1);
