import { sha256Hex } from '../../../procedures/engine/showing';

/** How far the fetching of a photo is. */
export type PhotoLoad =
  | { readonly status: 'loading' }
  /** An address of the bytes that holds as long as the page. */
  | { readonly status: 'there'; readonly url: string }
  /** The server does not have the bytes yet: the tablet still holds them. */
  | { readonly status: 'missing' }
  /** What came is not what the record names, or could not be fetched. */
  | { readonly status: 'failed'; readonly why: string };

/** The kinds of picture that are shown; the record's word for any other is not handed to the browser. */
const shownTypes: readonly string[] = ['image/jpeg', 'image/png', 'image/webp'];

/** A photo from its stored bytes, held against the hash that the record names. */
export function photoOf(bytes: Uint8Array, sha256: string, mediaType: string): PhotoLoad {
  if (sha256Hex(bytes) !== sha256) {
    return { status: 'failed', why: 'The photo is not the one that the record names: its hash differs.' };
  }
  if (!shownTypes.includes(mediaType))
    return { status: 'failed', why: `A photo of the kind ${mediaType} is not shown.` };
  return { status: 'there', url: URL.createObjectURL(new Blob([new Uint8Array(bytes)], { type: mediaType })) };
}
