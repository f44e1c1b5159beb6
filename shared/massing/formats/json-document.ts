import { createIssue, wholeFile } from '../issue-severities.ts';
import type { MassingIssue } from '../massing-issue.ts';
import { findJsonError } from './find-json-error.ts';

/** GeoJSON needs 8 levels (a MultiPolygon in a collection); what nests far deeper is no drawing. */
const deepestNesting = 64;

export type JsonDocument = { ok: true; value: unknown } | { ok: false; issue: MassingIssue };

/** Decodes UTF-8 (with or without byte order mark) and parses JSON, refusing what nests too deeply. */
export function parseJsonDocument(bytes: Uint8Array, fileName: string): JsonDocument {
  const text = decodeUtf8(bytes);
  if (text === null) {
    return refuse(
      'MASSING_ENCODING',
      `${fileName} holds characters that are not UTF-8.`,
      'Save the file as UTF-8 and send it again.',
    );
  }
  if (nestingDepth(bytes) > deepestNesting) {
    return refuse(
      'MASSING_JSON_TOO_DEEP',
      `${fileName} nests brackets more than ${deepestNesting} levels deep; that is no massing.`,
      'Export the massing again as GeoJSON with plain polygons.',
    );
  }
  try {
    const value: unknown = JSON.parse(text);
    return { ok: true, value };
  } catch {
    return refuse(
      'MASSING_JSON_INVALID',
      `${fileName} is not valid JSON (${describePlace(text, findJsonError(text) ?? text.length)}).`,
      /[\s:,[](NaN|-?Infinity)\b/.test(text)
        ? 'It holds NaN or Infinity, which JSON does not know: give every coordinate and height a number.'
        : 'Export it again; it may have been cut off or edited by hand.',
    );
  }
}

function refuse(
  code: 'MASSING_ENCODING' | 'MASSING_JSON_TOO_DEEP' | 'MASSING_JSON_INVALID',
  message: string,
  suggestion: string,
): JsonDocument {
  return { ok: false, issue: createIssue(code, wholeFile, message, suggestion) };
}

function decodeUtf8(bytes: Uint8Array): string | null {
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(bytes);
  } catch {
    return null;
  }
}

/** The deepest level of brackets outside of strings. Every byte that matters here is ASCII in UTF-8. */
function nestingDepth(bytes: Uint8Array): number {
  const [quote, backslash] = [0x22, 0x5c];
  let depth = 0;
  let deepest = 0;
  let isInString = false;
  for (let i = 0; i < bytes.length; i++) {
    const byte = bytes[i];
    if (isInString) {
      if (byte === backslash) i++;
      else if (byte === quote) isInString = false;
    } else if (byte === quote) isInString = true;
    else if (byte === 0x7b || byte === 0x5b) deepest = Math.max(deepest, ++depth);
    else if (byte === 0x7d || byte === 0x5d) depth--;
  }
  return deepest;
}

function describePlace(text: string, position: number): string {
  const lines = text.slice(0, position).split('\n');
  return `line ${lines.length}, column ${(lines.at(-1)?.length ?? 0) + 1}`;
}

export function isRecord(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}
