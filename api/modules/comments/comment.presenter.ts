import type { Comment as CommentDetail } from '../../../shared/contracts/comments.ts';
import type { Comment } from './comment.entity.ts';

/** The e-mail address and the reason for withholding are for staff alone. */
export function presentComment(comment: Comment, isStaff: boolean): CommentDetail {
  return {
    id: comment.id,
    authorName: comment.authorName,
    body: comment.body,
    pin: comment.pin ?? null,
    revision: comment.revision ?? null,
    receivedAt: comment.receivedAt.toISOString(),
    state: comment.state,
    withheldReason: isStaff ? (comment.withheldReason ?? null) : null,
    authorEmail: isStaff ? comment.authorEmail : null,
  };
}
