import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { signInInputSchema, type Person } from '../../../../shared/contracts/people.ts';
import { Button } from '../../../components/button.tsx';
import { FormTextField } from '../../../components/form-text-field.tsx';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { useCreateSession } from '../api/create-session.ts';

export interface SignInFormProps {
  onSignedIn: (person: Person) => void;
}

export function SignInForm({ onSignedIn }: SignInFormProps) {
  const createSession = useCreateSession();
  const { control, handleSubmit } = useForm({
    resolver: zodResolver(signInInputSchema),
    defaultValues: { email: '', password: '' },
  });
  const send = handleSubmit((input) => {
    createSession.mutate(input, {
      onSuccess: ({ person }) => {
        if (person !== null) onSignedIn(person);
      },
    });
  });
  return (
    <form noValidate className="grid max-w-sm gap-4" onSubmit={(event) => void send(event)}>
      <FormTextField
        control={control}
        name="email"
        type="email"
        label="E-mail address"
        autoComplete="username"
      />
      <FormTextField
        control={control}
        name="password"
        type="password"
        label="Password"
        autoComplete="current-password"
      />
      {createSession.isError ? <ProblemNotice error={createSession.error} /> : null}
      <Button
        type="submit"
        kind="primary"
        isPending={createSession.isPending}
        className="justify-self-start"
      >
        Sign in
      </Button>
    </form>
  );
}
