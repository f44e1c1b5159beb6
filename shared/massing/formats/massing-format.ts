import type { ReadMassing } from '../massing-reading.ts';

/** A file as the formats look at it. */
export interface MassingFile {
  bytes: Uint8Array;
  fileName: string;
  /** Its beginning as text, without byte order mark and leading white space. */
  head: string;
}

/** A file type, known by its content and never by its name. */
export interface KnownFormat {
  /** As a sentence calls it: `GeoJSON`, `a ZIP archive`. */
  name: string;
  recognises: (file: MassingFile) => boolean;
}

/** A file type that a massing can be read from. It never throws; what is wrong is said by issues. */
export interface MassingFormat extends KnownFormat {
  read: (file: MassingFile) => ReadMassing;
}
