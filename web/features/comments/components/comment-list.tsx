import type { Comment } from '../../../../shared/contracts/comments.ts';
import { EmptyState } from '../../../components/empty-state.tsx';
import { useFormats } from '../../../lib/place-context.ts';

export interface CommentListProps {
  comments: readonly Comment[];
  /** Comments may still be written. */
  isOpen: boolean;
}

/** What people have said, as published. */
export function CommentList({ comments, isOpen }: CommentListProps) {
  const formats = useFormats();
  if (comments.length === 0) {
    return (
      <EmptyState title="No comment is published yet.">
        <p>
          {isOpen
            ? 'Be the first: write below what the proposal means for you.'
            : 'Comments are taken while the case is open for comment.'}
        </p>
      </EmptyState>
    );
  }
  return (
    <ol className="border-t border-hairline">
      {comments.map((comment) => (
        <li key={comment.id} className="measure border-b border-hairline py-3">
          <p className="text-small text-ink-soft">
            <span className="font-strong text-ink">{comment.authorName}</span>,{' '}
            {formats.dateOfInstant(comment.receivedAt)}
            {comment.revision === null ? '' : `, on revision ${comment.revision}`}
            {comment.pin === null ? '' : ', with a place on the map'}
          </p>
          <p className="whitespace-pre-line">{comment.body}</p>
        </li>
      ))}
    </ol>
  );
}
