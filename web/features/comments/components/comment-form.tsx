import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import {
  commentLimits,
  createCommentInputSchema,
  type CreateCommentInput,
} from '../../../../shared/contracts/comments.ts';
import type { LngLat } from '../../../../shared/geometry/geojson-schema.ts';
import { Button } from '../../../components/button.tsx';
import { FormTextField } from '../../../components/form-text-field.tsx';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { useFormats } from '../../../lib/place-context.ts';
import { useCreateComment } from '../api/create-comment.ts';

export interface CommentFormProps {
  reference: string;
  /** Where the comment is about; null for the case as a whole. */
  pin: { lngLat: LngLat; words: string } | null;
  onRemovePin: () => void;
}

/** A comment without an account. */
export function CommentForm({ reference, pin, onRemovePin }: CommentFormProps) {
  const formats = useFormats();
  const createComment = useCreateComment(reference);
  const [idempotencyKey, setIdempotencyKey] = useState(() => crypto.randomUUID());
  const { control, handleSubmit, reset } = useForm({
    resolver: zodResolver(createCommentInputSchema.omit({ pin: true })),
    defaultValues: { authorName: '', authorEmail: '', body: '' },
  });

  const receipt = createComment.data;
  if (receipt !== undefined) {
    return (
      <div className="measure say grid justify-items-start gap-2" role="status">
        <p>
          <strong>Thank you. Your comment arrived {formats.instant(receipt.receivedAt)}.</strong>{' '}
          The planning department reads it, then publishes it here under your name. Your e-mail
          address stays with the department.
        </p>
        <Button
          kind="plain"
          onPress={() => {
            setIdempotencyKey(crypto.randomUUID());
            createComment.reset();
          }}
        >
          Write another
        </Button>
      </div>
    );
  }

  const send = handleSubmit((values) => {
    const input: CreateCommentInput = { ...values, pin: pin?.lngLat ?? null };
    createComment.mutate({ input, idempotencyKey }, { onSuccess: () => reset() });
  });
  return (
    <form
      noValidate
      className="measure grid gap-4"
      aria-label="Write a comment"
      onSubmit={(event) => void send(event)}
    >
      <FormTextField
        control={control}
        name="body"
        label="What do you want to say?"
        rows={6}
        maxLength={commentLimits.bodyCharacters}
        description="Say what changes for you, and at what time of day or year. Leave out what shall not be public."
      />
      <PinLine pin={pin} onRemovePin={onRemovePin} />
      <div className="grid gap-4 sm:grid-cols-2">
        <FormTextField
          control={control}
          name="authorName"
          label="Your name"
          description="Published with the comment."
          autoComplete="name"
        />
        <FormTextField
          control={control}
          name="authorEmail"
          type="email"
          label="Your e-mail address"
          description="Never published."
          autoComplete="email"
        />
      </div>
      {createComment.isError ? <ProblemNotice error={createComment.error} /> : null}
      <Button
        type="submit"
        kind="primary"
        isPending={createComment.isPending}
        className="justify-self-start"
      >
        Send the comment
      </Button>
    </form>
  );
}

function PinLine({ pin, onRemovePin }: Pick<CommentFormProps, 'pin' | 'onRemovePin'>) {
  return (
    <p className="text-small">
      {pin === null ? (
        'It is about the case as a whole. To tie it to a place, find your parcel above or point at it on the map.'
      ) : (
        <>
          It is tied to <strong>{pin.words}</strong>.{' '}
          <Button kind="plain" onPress={onRemovePin}>
            Make it about the case as a whole
          </Button>
        </>
      )}
    </p>
  );
}
