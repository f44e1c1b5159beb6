import type { ReadMassing } from '../massing-reading.ts';

/** A file type that a massing can come in: known by its content, never by its name. */
export interface MassingFormat {
  /** As a sentence calls it: `GeoJSON`, `a ZIP archive`. */
  name: string;
  recognises: (file: MassingFile) => boolean;
  /** Absent for a type that is known but not read yet. */
  read?: (file: MassingFile) => ReadMassing;
}

/** A file as the formats look at it. */
export interface MassingFile {
  bytes: Uint8Array;
  fileName: string;
  /** Its beginning as text, without byte order mark and leading white space. */
  head: string;
}
