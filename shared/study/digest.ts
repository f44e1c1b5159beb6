import { sha256 } from '@noble/hashes/sha2.js';
import { bytesToHex, utf8ToBytes } from '@noble/hashes/utils.js';
import canonicalize from 'canonicalize';
import type { EvidenceFile } from './evidence-schema.ts';

/**
 * SHA-256 over the canonical JSON (RFC 8785) of an evidence file without its `digest` and
 * `results.check`, as `sha256:` and hexadecimal digits.
 */
export function digestOf(evidence: Omit<EvidenceFile, 'digest'>): string {
  const { check: _check, ...results } = evidence.results;
  const canonical = canonicalize({ ...evidence, results, digest: undefined });
  if (canonical === undefined) throw new Error('A study that is no JSON has no digest.');
  return `sha256:${bytesToHex(sha256(utf8ToBytes(canonical)))}`;
}
