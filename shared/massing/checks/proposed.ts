import { createIssue, wholeFile } from '../issue-severities.ts';
import type { MassingCheck } from '../massing-scene.ts';

/** A massing proposes at least one block. */
export const checkProposed: MassingCheck = ({ blocks }) => {
  if (blocks.some(({ role }) => role === 'proposed')) return [];
  return [
    createIssue(
      'MASSING_NOTHING_PROPOSED',
      wholeFile,
      'No block in the file is proposed.',
      'Send the blocks of the proposed building with the role "proposed" (or without a role).',
    ),
  ];
};
