import { geojsonFormat } from './formats/geojson.ts';
import type { MassingFile, MassingFormat } from './formats/massing-format.ts';
import { unreadFormats } from './formats/unread-formats.ts';
import { createIssue, limitIssues, wholeFile, type IssueCode } from './issue-severities.ts';
import { massingLimits } from './massing-limits.ts';
import type { ReadMassing } from './massing-reading.ts';

export type { ReadMassing } from './massing-reading.ts';

const readFormats: readonly MassingFormat[] = [geojsonFormat];

/** How much of the file the formats look at to know it. */
const headBytes = 4096;

/**
 * Reads a massing file of any known type into blocks on WGS 84 with heights in metres. The type is decided by
 * the content. Whatever was put right or left out is said by an issue; the function never throws.
 * @param fileName Used in sentences only.
 */
export function readMassing(bytes: Uint8Array, fileName: string): ReadMassing {
  if (bytes.length === 0) {
    return refuse('MASSING_FILE_EMPTY', `${fileName} is empty.`, 'Export the massing again.');
  }
  if (bytes.length > massingLimits.fileBytes) {
    return refuse(
      'MASSING_FILE_TOO_LARGE',
      `${fileName} has ${megabytes(bytes.length)} MB; at most ${megabytes(massingLimits.fileBytes)} MB are read.`,
      'Send the massing alone: one footprint for each block, without terrain, surroundings or interiors.',
    );
  }
  const file: MassingFile = { bytes, fileName, head: headOf(bytes) };
  const unread = unreadFormats.find(({ recognises }) => recognises(file));
  if (unread !== undefined) {
    return refuse(
      'MASSING_FORMAT_NOT_READ',
      `${fileName} is ${unread.name}, which is not read yet.`,
      'Send the massing as GeoJSON: one polygon for each block, on WGS 84, with base and top in metres.',
    );
  }
  if (isUtf16(bytes)) {
    return refuse(
      'MASSING_ENCODING',
      `${fileName} is text in UTF-16.`,
      'Save the file as UTF-8 and send it again.',
    );
  }
  const format = readFormats.find(({ recognises }) => recognises(file));
  if (format === undefined) {
    return refuse(
      'MASSING_FORMAT_UNKNOWN',
      `${fileName} is of no type that is known here.`,
      'Send the massing as GeoJSON.',
    );
  }
  const reading = format.read(file);
  return { ...reading, issues: limitIssues(reading.issues) };
}

function refuse(code: IssueCode, message: string, suggestion: string): ReadMassing {
  return { ok: false, issues: [createIssue(code, wholeFile, message, suggestion)] };
}

function headOf(bytes: Uint8Array): string {
  // The decoder takes the byte order mark away.
  return new TextDecoder('utf-8').decode(bytes.subarray(0, headBytes)).trimStart();
}

/** By its byte order mark, or by an ASCII character in the first two bytes with a zero beside it. */
function isUtf16([first, second]: Uint8Array): boolean {
  if ((first === 0xff && second === 0xfe) || (first === 0xfe && second === 0xff)) return true;
  return (first === 0 && isAscii(second)) || (isAscii(first) && second === 0);
}

function isAscii(byte: number | undefined): boolean {
  return byte !== undefined && byte >= 0x09 && byte < 0x7f;
}

function megabytes(bytes: number): string {
  return (bytes / 1024 / 1024).toFixed(1);
}
