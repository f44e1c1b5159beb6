import type { MassingBlock } from './massing-block.ts';
import type { MassingIssue } from './massing-issue.ts';

/**
 * What came out of a file. `ok` means that it could be read as a massing at all; single blocks that could not
 * be read are missing from `blocks` and named by an issue of severity `error`.
 */
export type ReadMassing =
  | { ok: true; blocks: MassingBlock[]; issues: MassingIssue[] }
  | { ok: false; issues: MassingIssue[] };
