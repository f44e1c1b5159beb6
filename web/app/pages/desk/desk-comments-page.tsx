import { useMemo } from 'react';
import { commentableCaseStates } from '../../../../shared/contracts/case-life.ts';
import type { CaseDetail } from '../../../../shared/contracts/cases.ts';
import {
  commentStateSchema,
  type Comment,
  type CommentState,
} from '../../../../shared/contracts/comments.ts';
import { ChoiceRow } from '../../../components/choice-row.tsx';
import { EmptyState } from '../../../components/empty-state.tsx';
import { Pager } from '../../../components/pager.tsx';
import { QueryView } from '../../../components/query-view.tsx';
import { useComments } from '../../../features/comments/api/list-comments.ts';
import { CommentList } from '../../../features/comments/components/comment-list.tsx';
import { ModeratedComment } from '../../../features/comments/components/moderated-comment.tsx';
import { usePlace } from '../../../lib/place-context.ts';
import { useSearchState } from '../../../lib/use-search-state.ts';
import { CaseMap } from '../../../map/case-map.tsx';
import { boundsAround, type Bounds, type MapPin } from '../../../map/map-features.ts';
import { useDeskCase } from './desk-case-page.tsx';

const pageSize = 50;
const everyState = 'all';
const stateOptions: { id: CommentState | typeof everyState; label: string }[] = [
  { id: everyState, label: 'All' },
  { id: 'waiting', label: 'Waiting' },
  { id: 'published', label: 'Published' },
  { id: 'withheld', label: 'Withheld' },
];

/** What people say about the case; staff read all of it, the board what is published. */
export function DeskCommentsPage() {
  const reviewCase = useDeskCase();
  return reviewCase.abilities.includes('read-every-comment') ? (
    <EveryComment reviewCase={reviewCase} />
  ) : (
    <PublishedComments reviewCase={reviewCase} />
  );
}

function PublishedComments({ reviewCase }: { reviewCase: CaseDetail }) {
  const comments = useComments(reviewCase.reference, { pageSize: 200 });
  return (
    <section className="grid gap-4" aria-label="Comments">
      <h2>Comments</h2>
      <QueryView query={comments} what="the comments">
        {({ rows }) => (
          <CommentList comments={rows} isOpen={commentableCaseStates.includes(reviewCase.state)} />
        )}
      </QueryView>
    </section>
  );
}

function EveryComment({ reviewCase }: { reviewCase: CaseDetail }) {
  const { reference } = reviewCase;
  const [stateText, setState] = useSearchState('comments');
  const [pageText, setPage] = useSearchState('page');
  const state = commentStateSchema.safeParse(stateText).data;
  const comments = useComments(reference, {
    page: Math.max(1, Number(pageText) || 1),
    pageSize,
    ...(state === undefined ? {} : { state }),
  });
  return (
    <section className="grid gap-4" aria-label="Comments">
      <div className="flex flex-wrap items-baseline justify-between gap-x-6 gap-y-2">
        <h2>Comments</h2>
        <ChoiceRow
          label="Which comments"
          options={stateOptions}
          value={state ?? everyState}
          onChange={(next) => setState(next === everyState ? null : next)}
        />
      </div>
      <QueryView query={comments} what="the comments">
        {({ rows, page, total }) =>
          rows.length === 0 ? (
            <EmptyState
              title={
                state === undefined ? 'No comment has come in yet.' : 'No comment is in this state.'
              }
            >
              {commentableCaseStates.includes(reviewCase.state) ? null : (
                <p>Comments are taken while the case is open for comment.</p>
              )}
            </EmptyState>
          ) : (
            <>
              <CommentsWithMap reviewCase={reviewCase} comments={rows} />
              <Pager
                page={page}
                pageSize={pageSize}
                total={total}
                onPage={(next) => setPage(next === 1 ? null : String(next))}
              />
            </>
          )
        }
      </QueryView>
    </section>
  );
}

interface CommentsWithMapProps {
  reviewCase: CaseDetail;
  comments: readonly Comment[];
}

const marginM = 80;

function CommentsWithMap({ reviewCase, comments }: CommentsWithMapProps) {
  const { municipality } = usePlace();
  const [chosen, setChosen] = useSearchState('comment');
  const { site } = reviewCase;
  const pins = useMemo<MapPin[]>(
    () =>
      comments.flatMap(({ id, pin, authorName }) =>
        pin === null ? [] : [{ id, lngLat: pin, label: authorName, isChosen: id === chosen }],
      ),
    [comments, chosen],
  );
  const bounds = useMemo<Bounds>(() => {
    const points = comments.flatMap(({ pin }) =>
      pin === null ? [] : [{ type: 'Point' as const, coordinates: pin }],
    );
    const geometries = [...(site === null ? [] : [site]), ...points];
    return boundsAround(geometries, marginM) ?? municipality.extent;
  }, [comments, site, municipality.extent]);
  return (
    <div
      className={
        pins.length === 0
          ? ''
          : 'grid items-start gap-x-8 gap-y-4 lg:grid-cols-[minmax(0,3fr)_minmax(0,2fr)]'
      }
    >
      <ol className="border-t border-hairline">
        {comments.map((comment) => (
          <ModeratedComment
            key={comment.id}
            reference={reviewCase.reference}
            comment={comment}
            canModerate={reviewCase.abilities.includes('moderate-comments')}
            isChosen={comment.id === chosen}
            onShowPlace={() => setChosen(comment.id)}
          />
        ))}
      </ol>
      {pins.length === 0 ? null : (
        <CaseMap
          label="Where the comments are about"
          bounds={bounds}
          site={site}
          pins={pins}
          onPick={({ pin }) => {
            if (pin !== null) setChosen(pin);
          }}
          className="h-80 lg:h-[28rem]"
          alternative={<p className="text-ink-soft">The list of comments says the same.</p>}
        />
      )}
    </div>
  );
}
