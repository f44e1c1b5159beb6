import { cleanup, fireEvent, screen, waitFor } from '@testing-library/react';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { InvitationForm } from '../../../../web/features/session/components/invitation-form.tsx';
import { renderInPlace } from '../../support/render-in-place.tsx';
import { stubFetch } from '../../support/stub-fetch.ts';

const person = {
  id: '00000000-0000-4000-8000-000000000009',
  name: 'Perrin Oakwhistle',
  email: 'perrin@brinewell.example',
  role: 'administrator',
};

afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

describe('the form behind a one-time link', () => {
  it('makes the account and hands on whose it is', async () => {
    stubFetch(201, { person });
    const onAccepted = vi.fn();
    renderInPlace(<InvitationForm token="a-token-of-some-length" onAccepted={onAccepted} />);
    const write = (label: string, value: string) =>
      fireEvent.change(screen.getByLabelText(label), { target: { value } });
    write('Your name', person.name);
    write('Your e-mail address', person.email);
    write('A new password', 'four words that belong');
    fireEvent.click(screen.getByRole('button', { name: 'Set the password and sign in' }));
    await waitFor(() => expect(onAccepted).toHaveBeenCalledWith(person));
  });
});
