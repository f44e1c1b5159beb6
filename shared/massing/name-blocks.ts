import type { BlockLabel } from './block-label.ts';
import { createIssue, wholeFile } from './issue-severities.ts';
import type { MassingBlock } from './massing-block.ts';
import type { MassingIssue } from './massing-issue.ts';
import { cleanText, cutText } from './plain-text.ts';

/** A block as read, before its id is settled. */
export interface UnnamedBlock extends Omit<MassingBlock, 'id'> {
  id: string | null;
  label: BlockLabel;
}

/** An id enters the evidence file, which takes no longer ones. */
const longestId = 100;
const longestName = 200;

/** Whether an id says no more than a block's place among the others. */
export function isNumberedId(id: string): boolean {
  return /^block-\d+(-\d+)?$/.test(id);
}

/** Gives every block an id of its own and says what it changed. An id that stands once stays as it is. */
export function nameBlocks(unnamed: readonly UnnamedBlock[]): {
  blocks: MassingBlock[];
  issues: MassingIssue[];
} {
  const issues: MassingIssue[] = [];
  const wanted = unnamed.map((block) => wantId(block, issues));
  const sent = new Set(wanted);
  const taken = new Set<string>();
  const numbered: string[] = [];

  const blocks = unnamed.map(({ label, ...block }, index): MassingBlock => {
    const wish = wanted[index] ?? null;
    const first = wish ?? `block-${index + 1}`;
    const isFree = !taken.has(first) && (wish !== null || !sent.has(first));
    const id = isFree ? first : findFreeId(first, taken, sent);
    taken.add(id);
    if (wish === null) numbered.push(id);
    else if (id !== wish) {
      issues.push(
        createIssue(
          'MASSING_ID_REPEATED',
          { feature: id, lngLat: null },
          `${label.text} has an id that stood before; it was renamed ${id}.`,
          'Give every block an id of its own, so that revisions can be compared.',
        ),
      );
    }
    return { ...block, id, name: settleName(block.name, id, issues) };
  });

  if (numbered.length > 0) issues.push(describeNumbered(numbered));
  return { blocks, issues };
}

/** The id as sent, without what no one can read and not too long; null where there is none. */
function wantId({ id, label }: UnnamedBlock, issues: MassingIssue[]): string | null {
  if (id === null) return null;
  const clean = cleanText(id);
  const place = { feature: label.feature, lngLat: null };
  if (clean !== id) {
    issues.push(createIssue('MASSING_TEXT_CLEANED', place, describeCleaned(label.text, 'id')));
  }
  if (clean.length > longestId) {
    issues.push(
      createIssue(
        'MASSING_ID_TOO_LONG',
        place,
        `${label.text} has an id of more than ${longestId} characters; it was cut.`,
        'Give every block a short id of its own, so that revisions can be compared.',
      ),
    );
  }
  return clean === '' ? null : cutText(clean, longestId);
}

function settleName(name: string | null, id: string, issues: MassingIssue[]): string | null {
  if (name === null) return null;
  const clean = cleanText(name);
  const place = { feature: id, lngLat: null };
  if (clean !== name) {
    issues.push(createIssue('MASSING_TEXT_CLEANED', place, describeCleaned(`Block ${id}`, 'name')));
  }
  if (clean.length > longestName) {
    issues.push(
      createIssue(
        'MASSING_NAME_TOO_LONG',
        place,
        `Block ${id} has a name of more than ${longestName} characters; it was cut.`,
      ),
    );
  }
  return clean === '' ? null : cutText(clean, longestName);
}

function describeCleaned(block: string, what: string): string {
  return `${block} has characters in its ${what} that cannot be shown; they were left out.`;
}

function findFreeId(wanted: string, taken: Set<string>, sent: Set<string | null>): string {
  for (let number = 2; ; number++) {
    const ending = `-${number}`;
    const id = cutText(wanted, longestId - ending.length) + ending;
    if (!taken.has(id) && !sent.has(id)) return id;
  }
}

function describeNumbered(ids: readonly string[]): MassingIssue {
  const shown = ids.slice(0, 5).join(', ');
  const list = ids.length > 5 ? `${shown} and ${ids.length - 5} more` : shown;
  return createIssue(
    'MASSING_ID_MISSING',
    wholeFile,
    `${ids.length === 1 ? '1 block has no id and was' : `${ids.length} blocks have no id and were`} numbered by order: ${list}.`,
    'Give every block an id of its own, so that revisions can be compared.',
  );
}
