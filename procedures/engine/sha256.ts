import { sha256 } from '@noble/hashes/sha2';
import { bytesToHex, utf8ToBytes } from '@noble/hashes/utils';

/** SHA-256 (FIPS 180-4) of the bytes, or of the text's UTF-8 bytes, as 64 hexadecimal digits. Synchronous, the same everywhere. */
export function sha256Hex(content: string | Uint8Array): string {
  return bytesToHex(sha256(typeof content === 'string' ? utf8ToBytes(content) : content));
}
