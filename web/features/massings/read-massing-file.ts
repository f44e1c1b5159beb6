import type { MassingFigures } from '../../../shared/massing/massing-figures.ts';
import type { MassingIssue } from '../../../shared/massing/massing-issue.ts';
import type { MassingSite } from '../../../shared/massing/massing-scene.ts';
import { toDrawnBlocks, type DrawnBlock } from './drawn-block.ts';

/** What was understood of a massing file, before anything is sent. */
export interface MassingFileReading {
  file: File;
  blocks: DrawnBlock[];
  issues: MassingIssue[];
  /** Null where the file could not be read as a massing. */
  figures: MassingFigures | null;
  /** Nothing forbids sending it. */
  isSound: boolean;
}

/** Reads and checks a file in the browser by the code that the server uses; that code is loaded here. */
export async function readMassingFile(file: File, site: MassingSite): Promise<MassingFileReading> {
  const [{ readMassing }, { checkMassing }, { measureMassing }, bytes] = await Promise.all([
    import('../../../shared/massing/read-massing.ts'),
    import('../../../shared/massing/check-massing.ts'),
    import('../../../shared/massing/measure-massing.ts'),
    file.arrayBuffer(),
  ]);
  const reading = readMassing(new Uint8Array(bytes), file.name);
  if (!reading.ok) {
    return { file, blocks: [], issues: reading.issues, figures: null, isSound: false };
  }
  const issues = [...reading.issues, ...checkMassing(reading.blocks, site)];
  return {
    file,
    blocks: toDrawnBlocks(reading.blocks),
    issues,
    figures: measureMassing(reading.blocks),
    isSound: issues.every(({ severity }) => severity !== 'error'),
  };
}
