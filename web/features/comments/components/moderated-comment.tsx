import { useState } from 'react';
import {
  moderateCommentInputSchema,
  type Comment,
  type ModerateCommentInput,
} from '../../../../shared/contracts/comments.ts';
import { Button } from '../../../components/button.tsx';
import { ConfirmDialog } from '../../../components/confirm-dialog.tsx';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { TextField } from '../../../components/text-field.tsx';
import { useToast } from '../../../components/toast.tsx';
import { useFormats } from '../../../lib/place-context.ts';
import { useModerateComment } from '../api/moderate-comment.ts';

export interface ModeratedCommentProps {
  reference: string;
  comment: Comment;
  canModerate: boolean;
  isChosen: boolean;
  /** Shows its place on the map. */
  onShowPlace: () => void;
}

const stateWords = {
  waiting: 'waiting to be read',
  published: 'published',
  withheld: 'withheld',
} as const satisfies Record<Comment['state'], string>;

/** A comment as staff read it, with what becomes of it. */
export function ModeratedComment({
  reference,
  comment,
  canModerate,
  isChosen,
  onShowPlace,
}: ModeratedCommentProps) {
  const formats = useFormats();
  const [asked, setAsked] = useState<ModerateCommentInput['state'] | null>(null);
  return (
    <li
      className={`grid gap-1.5 border-b border-hairline py-3 ${isChosen ? 'bg-marigold-wash' : ''}`}
    >
      <p className="flex flex-wrap gap-x-3 text-small text-ink-soft">
        <span>
          <span className="font-strong text-ink">{comment.authorName}</span>
          {comment.authorEmail === null ? '' : `, ${comment.authorEmail}`}
        </span>
        <span>{formats.instant(comment.receivedAt)}</span>
        {comment.revision === null ? null : <span>on revision {comment.revision}</span>}
        <span className="text-ink">{stateWords[comment.state]}</span>
      </p>
      <p className="measure whitespace-pre-line">{comment.body}</p>
      {comment.withheldReason === null ? null : (
        <p className="measure text-small">Withheld because: {comment.withheldReason}</p>
      )}
      <p className="flex flex-wrap gap-x-5 text-small">
        {canModerate && comment.state !== 'published' ? (
          <Button kind="plain" onPress={() => setAsked('published')}>
            Publish
          </Button>
        ) : null}
        {canModerate && comment.state !== 'withheld' ? (
          <Button kind="plain" onPress={() => setAsked('withheld')}>
            Withhold
          </Button>
        ) : null}
        {comment.pin === null ? null : (
          <Button kind="plain" onPress={onShowPlace}>
            Show its place
          </Button>
        )}
      </p>
      {asked === null ? null : (
        <ModerationDialog
          reference={reference}
          comment={comment}
          to={asked}
          onClose={() => setAsked(null)}
        />
      )}
    </li>
  );
}

interface ModerationDialogProps {
  reference: string;
  comment: Comment;
  to: ModerateCommentInput['state'];
  onClose: () => void;
}

function ModerationDialog({ reference, comment, to, onClose }: ModerationDialogProps) {
  const moderate = useModerateComment(reference, comment.id);
  const showToast = useToast();
  const [reason, setReason] = useState('');
  const [problem, setProblem] = useState<string | undefined>(undefined);
  const isWithholding = to === 'withheld';
  const handleConfirm = () => {
    const input = moderateCommentInputSchema.safeParse(
      isWithholding ? { state: to, reason } : { state: to },
    );
    if (!input.success) {
      setProblem(input.error.issues[0]?.message);
      return;
    }
    moderate.mutate(input.data, {
      onSuccess: () => {
        onClose();
        showToast(isWithholding ? 'The comment is withheld.' : 'The comment is published.');
      },
    });
  };
  return (
    <ConfirmDialog
      title={isWithholding ? 'Withhold this comment?' : 'Publish this comment?'}
      confirmLabel={isWithholding ? 'Withhold it' : 'Publish it'}
      isOpen
      isPending={moderate.isPending}
      onConfirm={handleConfirm}
      onCancel={onClose}
    >
      <p>
        {isWithholding
          ? 'The public will not see it. It stays in the file with your reason.'
          : `Everybody will read it with the name ${comment.authorName}; the e-mail address is never shown. Look that it holds no personal data of others.`}
      </p>
      {isWithholding ? (
        <TextField label="Reason" rows={3} value={reason} onChange={setReason} problem={problem} />
      ) : null}
      {moderate.isError ? <ProblemNotice error={moderate.error} /> : null}
    </ConfirmDialog>
  );
}
