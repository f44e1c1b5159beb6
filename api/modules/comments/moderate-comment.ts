import { LockMode } from '@mikro-orm/core';
import type { EntityManager } from '@mikro-orm/postgresql';
import type { ModerateCommentInput } from '../../../shared/contracts/comments.ts';
import { AppError } from '../../errors.ts';
import type { Actor } from '../../policy.ts';
import { requireOnCase } from '../cases/get-case.ts';
import { Person } from '../people/person.entity.ts';
import { Comment } from './comment.entity.ts';

/** Publishes or withholds a comment; a planner may change their mind. */
export async function moderateComment(
  em: EntityManager,
  actor: Actor,
  id: string,
  input: ModerateCommentInput,
): Promise<Comment> {
  return em.transactional(async (tx) => {
    const comment = await tx.findOne(
      Comment,
      { id },
      { lockMode: LockMode.PESSIMISTIC_WRITE, refresh: true },
    );
    if (comment === null) throw new AppError('NOT_FOUND', { title: 'There is no such comment.' });
    await tx.populate(comment, ['reviewCase']);
    requireOnCase(actor, 'moderate-comments', comment.reviewCase);
    tx.assign(comment, {
      state: input.state,
      withheldReason: input.state === 'withheld' ? input.reason : null,
      moderatedBy: await tx.findOneOrFail(Person, actor.id),
      moderatedAt: new Date(),
    });
    return comment;
  });
}
