import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { acceptInvitationInputSchema, type Person } from '../../../../shared/contracts/people.ts';
import { Button } from '../../../components/button.tsx';
import { FormTextField } from '../../../components/form-text-field.tsx';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { useAcceptInvitation } from '../api/accept-invitation.ts';

export interface InvitationFormProps {
  token: string;
  onAccepted: (person: Person) => void;
}

/** Name and password for an account that was offered by a one-time link. */
export function InvitationForm({ token, onAccepted }: InvitationFormProps) {
  const acceptInvitation = useAcceptInvitation();
  const { control, handleSubmit } = useForm({
    resolver: zodResolver(acceptInvitationInputSchema.omit({ token: true })),
    defaultValues: { name: '', email: '', password: '' },
  });
  const send = handleSubmit((input) => {
    acceptInvitation.mutate(
      { ...input, token },
      {
        onSuccess: ({ person }) => {
          if (person !== null) onAccepted(person);
        },
      },
    );
  });
  return (
    <form noValidate className="grid max-w-sm gap-4" onSubmit={(event) => void send(event)}>
      <FormTextField control={control} name="name" label="Your name" autoComplete="name" />
      <FormTextField
        control={control}
        name="email"
        type="email"
        label="Your e-mail address"
        description="You sign in with it."
        autoComplete="username"
      />
      <FormTextField
        control={control}
        name="password"
        type="password"
        label="A new password"
        description="At least 12 characters. A few words that belong together only for you are best."
        autoComplete="new-password"
      />
      {acceptInvitation.isError ? <ProblemNotice error={acceptInvitation.error} /> : null}
      <Button
        type="submit"
        kind="primary"
        isPending={acceptInvitation.isPending}
        className="justify-self-start"
      >
        Set the password and sign in
      </Button>
    </form>
  );
}
