import type { EntityManager } from '@mikro-orm/postgresql';
import type { z } from 'zod';
import type { createCommentInputSchema } from '../../../shared/contracts/comments.ts';
import { AppError } from '../../errors.ts';
import type { Actor } from '../../policy.ts';
import { mayOnCase } from '../../policy.ts';
import { caseFacts, getCase } from '../cases/get-case.ts';
import { findCurrentMassing } from '../massings/get-massing.ts';
import { Comment } from './comment.entity.ts';

/** Takes a comment on a case that is open for comment; it waits until a planner has looked at it. */
export async function createComment(
  em: EntityManager,
  actor: Actor | null,
  reference: string,
  input: z.output<typeof createCommentInputSchema>,
): Promise<Comment> {
  const reviewCase = await getCase(em, actor, reference);
  // Nobody signs in to comment, so signing in would be the wrong advice.
  if (!mayOnCase(actor, 'write-comment', caseFacts(reviewCase))) {
    throw new AppError('FORBIDDEN', {
      title: 'This case is not open for comment now. Its page shows where it stands.',
    });
  }
  const massing = await findCurrentMassing(em, reviewCase);
  const comment = em.create(Comment, {
    reviewCase,
    ...input,
    revision: massing?.revision ?? null,
    receivedAt: new Date(),
    state: 'waiting',
  });
  await em.flush();
  return comment;
}
