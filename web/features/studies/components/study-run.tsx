import { useState } from 'react';
import type { StudyDetail } from '../../../../shared/contracts/studies.ts';
import { Button } from '../../../components/button.tsx';
import { ConfirmDialog } from '../../../components/confirm-dialog.tsx';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { useCancelStudy } from '../api/cancel-study.ts';
import { useStudyProgress } from '../api/watch-study.ts';

export interface StudyRunProps {
  /** Waiting or running. */
  study: StudyDetail;
  canCancel: boolean;
}

/** A study under way, in instants done of instants to do; it goes on when the page is left. */
export function StudyRun({ study, canCancel }: StudyRunProps) {
  const progress = useStudyProgress(study.id) ?? study;
  const cancelStudy = useCancelStudy(study.id);
  const [isAsking, setIsAsking] = useState(false);
  const { instantsDone, instantsTotal } = progress;
  const words =
    instantsTotal === 0
      ? 'The study waits for its turn.'
      : `${instantsDone} of ${instantsTotal} instants computed.`;
  return (
    <section className="measure grid gap-3" aria-label="Study under way">
      <h2>The study of revision {study.revision} is under way</h2>
      <progress
        className="h-3 w-full appearance-none border border-ink bg-sheet [&::-moz-progress-bar]:bg-ink [&::-webkit-progress-bar]:bg-sheet [&::-webkit-progress-value]:bg-ink"
        aria-label="Instants computed"
        max={Math.max(1, instantsTotal)}
        value={instantsDone}
      />
      <p role="status">{words}</p>
      <p className="text-small text-ink-soft">You can leave this page; the study goes on.</p>
      {canCancel ? (
        <Button className="justify-self-start" onPress={() => setIsAsking(true)}>
          Stop the study
        </Button>
      ) : null}
      {cancelStudy.isError ? <ProblemNotice error={cancelStudy.error} /> : null}
      <ConfirmDialog
        title="Stop the study?"
        confirmLabel="Stop the study"
        isOpen={isAsking}
        isPending={cancelStudy.isPending}
        onConfirm={() => cancelStudy.mutate(undefined, { onSettled: () => setIsAsking(false) })}
        onCancel={() => setIsAsking(false)}
      >
        <p>
          What is computed so far is thrown away. You can run the study again from its beginning.
        </p>
      </ConfirmDialog>
    </section>
  );
}
