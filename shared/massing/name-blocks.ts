import type { BlockLabel } from './block-label.ts';
import { createIssue, wholeFile } from './issue-severities.ts';
import type { MassingBlock } from './massing-block.ts';
import type { MassingIssue } from './massing-issue.ts';

/** A block as read, before its id is settled. */
export interface UnnamedBlock extends Omit<MassingBlock, 'id'> {
  id: string | null;
  label: BlockLabel;
}

/** An id enters the evidence file, which takes no longer ones. */
const longestId = 100;
const longestName = 200;

function numberId(number: number): string {
  return `block-${number}`;
}

/** Whether an id says no more than a block's place in its file. */
export function isNumberedId(id: string): boolean {
  return /^block-\d+(-\d+)?$/.test(id);
}

/** Gives every block an id of its own and says what it changed. An id that stands once stays as it is. */
export function nameBlocks(unnamed: readonly UnnamedBlock[]): {
  blocks: MassingBlock[];
  issues: MassingIssue[];
} {
  const issues: MassingIssue[] = [];
  const sent = new Set(unnamed.map(({ id }) => id));
  const taken = new Set<string>();
  const numbered: string[] = [];

  const blocks = unnamed.map(({ label, ...block }, index): MassingBlock => {
    const wanted = block.id?.slice(0, longestId) ?? numberId(index + 1);
    const isFree = !taken.has(wanted) && (wanted === block.id || !sent.has(wanted));
    const id = isFree ? wanted : findFreeId(wanted, taken, sent);
    taken.add(id);
    if (block.id === null) numbered.push(id);
    else if (id !== block.id) {
      const isTooLong = block.id.length > longestId;
      issues.push(
        createIssue(
          isTooLong ? 'MASSING_ID_TOO_LONG' : 'MASSING_ID_REPEATED',
          { feature: id, lngLat: null },
          isTooLong
            ? `${label.text} has an id of more than ${longestId} characters; it was cut to ${id}.`
            : `${label.text} has an id that stood before; it was renamed ${id}.`,
          'Give every block an id of its own, so that revisions can be compared.',
        ),
      );
    }
    return { ...block, id, name: cutName(block.name, id, issues) };
  });

  if (numbered.length > 0) {
    issues.push(
      createIssue(
        'MASSING_ID_MISSING',
        wholeFile,
        `${numbered.length === 1 ? '1 block has' : `${numbered.length} blocks have`} no id and got one by the place in the file: ${listShort(numbered)}.`,
        'Give every block an id of its own, so that revisions can be compared.',
      ),
    );
  }
  return { blocks, issues };
}

function cutName(name: string | null, id: string, issues: MassingIssue[]): string | null {
  if (name === null || name.length <= longestName) return name;
  issues.push(
    createIssue(
      'MASSING_NAME_TOO_LONG',
      { feature: id, lngLat: null },
      `Block ${id} has a name of more than ${longestName} characters; it was cut.`,
    ),
  );
  return name.slice(0, longestName);
}

function findFreeId(wanted: string, taken: Set<string>, sent: Set<string | null>): string {
  for (let number = 2; ; number++) {
    const ending = `-${number}`;
    const id = wanted.slice(0, longestId - ending.length) + ending;
    if (!taken.has(id) && !sent.has(id)) return id;
  }
}

function listShort(ids: readonly string[]): string {
  const shown = ids.slice(0, 5).join(', ');
  return ids.length > 5 ? `${shown} and ${ids.length - 5} more` : shown;
}
