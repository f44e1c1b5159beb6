import type { UseQueryResult } from '@tanstack/react-query';
import { useState } from 'react';
import type { CaseDetail } from '../../../shared/contracts/cases.ts';
import type { CommentPage } from '../../../shared/contracts/comments.ts';
import { QueryView } from '../../components/query-view.tsx';
import { CommentForm } from '../../features/comments/components/comment-form.tsx';
import { CommentList } from '../../features/comments/components/comment-list.tsx';
import type { ChosenPlace } from './use-chosen-place.ts';

export interface CaseCommentsSectionProps {
  reviewCase: CaseDetail;
  /** The published ones. */
  comments: UseQueryResult<CommentPage>;
  place: ChosenPlace;
  isCommentable: boolean;
}

/** What people have said, and the form to say something. */
export function CaseCommentsSection({
  reviewCase,
  comments,
  place,
  isCommentable,
}: CaseCommentsSectionProps) {
  // Without the pin for the place that was chosen when the person took it off.
  const [unpinned, setUnpinned] = useState<string | null>(null);
  const pin =
    place.lngLat === null || unpinned === place.receptor
      ? null
      : { lngLat: place.lngLat, words: place.parcel?.address ?? 'the place that you chose' };
  return (
    <section
      id="comments"
      className="grid scroll-mt-4 content-start gap-5"
      aria-labelledby="comments-heading"
    >
      <h2 id="comments-heading">Comments</h2>
      <QueryView query={comments} what="the comments">
        {({ rows }) => <CommentList comments={rows} isOpen={isCommentable} />}
      </QueryView>
      {isCommentable && reviewCase.abilities.includes('write-comment') ? (
        <div className="no-print grid gap-3">
          <h3>Write a comment</h3>
          <CommentForm
            reference={reviewCase.reference}
            pin={pin}
            onRemovePin={() => setUnpinned(place.receptor)}
          />
        </div>
      ) : null}
    </section>
  );
}
