import { sha256 } from '@noble/hashes/sha2.js';
import { bytesToHex, utf8ToBytes } from '@noble/hashes/utils.js';
import { canonicalJson } from './canonicalJson.ts';
import type { Study } from './types.ts';

const known = new WeakMap<Study, string>();

/**
 * SHA-256 (FIPS 180-4) of the canonical JSON without the view, as 64 hexadecimal digits. Two studies with
 * the same data have the same fingerprint, however they were looked at or laid out in the file.
 */
export function fingerprint(study: Study): string {
  const remembered = known.get(study);
  if (remembered) return remembered;
  const digest = bytesToHex(sha256(utf8ToBytes(canonicalJson(study))));
  known.set(study, digest);
  return digest;
}
