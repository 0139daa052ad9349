import { sha256 } from '@noble/hashes/sha2.js'

/** SHA-256 of a text's UTF-8 bytes, 64 lower-case hexadecimal digits; alike in browser and server. */
export function sha256Hex(text: string): string {
  return Array.from(sha256(text), (byte) => byte.toString(16).padStart(2, '0')).join('')
}
