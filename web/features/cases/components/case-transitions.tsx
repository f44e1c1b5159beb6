import { useState } from 'react';
import type { CaseDetail } from '../../../../shared/contracts/cases.ts';
import { Button } from '../../../components/button.tsx';
import { ConfirmDialog } from '../../../components/confirm-dialog.tsx';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { TextField } from '../../../components/text-field.tsx';
import { useTransitionCase } from '../api/transition-case.ts';

export interface CaseTransitionsProps {
  reviewCase: CaseDetail;
  onMoved: (moved: CaseDetail) => void;
}

type Transition = CaseDetail['transitions'][number];

/** What the person may do with the case next; what stands in the way is said instead of a dead button. */
export function CaseTransitions({ reviewCase, onMoved }: CaseTransitionsProps) {
  const [asked, setAsked] = useState<Transition | null>(null);
  return (
    <div className="grid justify-items-start gap-4">
      {reviewCase.transitions.map((transition) => (
        <div key={transition.to} className="measure grid justify-items-start gap-1.5">
          {transition.obstacle === null ? (
            <Button
              kind={
                transition.to === 'withdrawn'
                  ? 'plain'
                  : transition.to === 'submitted'
                    ? 'primary'
                    : 'secondary'
              }
              onPress={() => setAsked(transition)}
            >
              {transition.label}
            </Button>
          ) : (
            <p className="say">
              <strong>{transition.label}:</strong> {transition.obstacle}
            </p>
          )}
        </div>
      ))}
      {asked === null ? null : (
        <TransitionDialog
          key={asked.to}
          reviewCase={reviewCase}
          transition={asked}
          onClose={() => setAsked(null)}
          onMoved={onMoved}
        />
      )}
    </div>
  );
}

interface TransitionDialogProps extends CaseTransitionsProps {
  transition: Transition;
  onClose: () => void;
}

const explanations: Partial<Record<Transition['to'], string>> = {
  submitted:
    'The planning department gets the application with its latest massing. You can change it again only if it is sent back to you.',
  'sent-back':
    'The applicant reads your reasons and sends a new revision. Write item by item what is to be corrected.',
  complete: 'The application is complete as of today: the clock of the review starts.',
  'under-review':
    'The planning department studies the case; the applicant can no longer change it.',
  'open-for-comment':
    'Everybody can read the case, its study and its figures from now on, and comment on it. This cannot be taken back.',
  'report-issued': 'The issued staff report goes to the board for its hearing.',
  continued: 'The hearing is put off. Comments are taken again. Write why and until when.',
  heard: 'The board has held its hearing; its decision is recorded next.',
  approved: 'Write the board’s vote and its grounds. The decision is public at once.',
  'approved-with-conditions':
    'Write the conditions one by one, and the board’s vote. The decision is public at once.',
  refused: 'Write the board’s vote and its grounds. The decision is public at once.',
  appealed: 'Write who appeals, when, and on what grounds.',
  remanded: 'Write what the case is sent back for. It goes under review again.',
  withdrawn: 'The case ends without a decision. This cannot be undone.',
};

function TransitionDialog({ reviewCase, transition, onClose, onMoved }: TransitionDialogProps) {
  const transitionCase = useTransitionCase(reviewCase.reference);
  const [reason, setReason] = useState('');
  const [dueDate, setDueDate] = useState('');
  const [isReasonMissing, setIsReasonMissing] = useState(false);
  const handleConfirm = () => {
    if (transition.needsReason && reason.trim() === '') {
      setIsReasonMissing(true);
      return;
    }
    transitionCase.mutate(
      {
        to: transition.to,
        from: reviewCase.state,
        ...(reason.trim() === '' ? {} : { reason: reason.trim() }),
        ...(dueDate === '' ? {} : { dueDate }),
      },
      {
        onSuccess: (moved) => {
          onClose();
          onMoved(moved);
        },
      },
    );
  };
  return (
    <ConfirmDialog
      title={`${transition.label}?`}
      confirmLabel={transition.label}
      isOpen
      isPending={transitionCase.isPending}
      isDanger={transition.to === 'withdrawn'}
      onConfirm={handleConfirm}
      onCancel={onClose}
    >
      <p>{explanations[transition.to] ?? 'The case moves on to its next state.'}</p>
      {transition.needsReason ? (
        <TextField
          label="Reason"
          rows={4}
          value={reason}
          onChange={setReason}
          problem={isReasonMissing && reason.trim() === '' ? 'Write the reason.' : undefined}
        />
      ) : null}
      {transition.to === 'sent-back' ? (
        <TextField
          label="Due by"
          optional
          type="date"
          value={dueDate}
          onChange={setDueDate}
          className="justify-self-start"
        />
      ) : null}
      {transitionCase.isError ? <ProblemNotice error={transitionCase.error} /> : null}
    </ConfirmDialog>
  );
}
