import { cleanup, fireEvent, screen, waitFor } from '@testing-library/react';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { SignInForm } from '../../../../web/features/session/components/sign-in-form.tsx';
import { safeNext } from '../../../../web/features/session/home-of-role.ts';
import { renderInPlace } from '../../support/render-in-place.tsx';
import { stubFetch } from '../../support/stub-fetch.ts';

const person = {
  id: '00000000-0000-4000-8000-000000000002',
  name: 'Ilse Vantwistle',
  email: 'applicant@larkhaven.example',
  role: 'applicant',
};

function signIn(email: string, password: string) {
  fireEvent.change(screen.getByLabelText('E-mail address'), { target: { value: email } });
  fireEvent.change(screen.getByLabelText('Password'), { target: { value: password } });
  fireEvent.click(screen.getByRole('button', { name: 'Sign in' }));
}

afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

describe('the sign-in form', () => {
  it('hands on who signed in', async () => {
    stubFetch(200, { person });
    const onSignedIn = vi.fn();
    renderInPlace(<SignInForm onSignedIn={onSignedIn} />);
    signIn('applicant@larkhaven.example', 'larkhaven-demo');
    await waitFor(() => expect(onSignedIn).toHaveBeenCalledWith(person));
  });

  it('says what is wrong with an address before sending it', async () => {
    const sent = stubFetch(200, { person });
    renderInPlace(<SignInForm onSignedIn={vi.fn()} />);
    signIn('applicant', 'larkhaven-demo');
    expect(await screen.findByText(/Write an e-mail address/)).toBeDefined();
    expect(sent).toHaveLength(0);
  });

  it('shows the server’s sentence when the two do not belong together', async () => {
    stubFetch(401, {
      title: 'This e-mail address and password do not belong together.',
      status: 401,
      code: 'SIGN_IN_FAILED',
    });
    const onSignedIn = vi.fn();
    renderInPlace(<SignInForm onSignedIn={onSignedIn} />);
    signIn('applicant@larkhaven.example', 'wrong');
    expect(await screen.findByText(/do not belong together/)).toBeDefined();
    expect(onSignedIn).not.toHaveBeenCalled();
  });
});

describe('the address to go on to after signing in', () => {
  it('is one of ours or none', () => {
    expect(safeNext('/desk/2026-0001?layer=net-new')).toBe('/desk/2026-0001?layer=net-new');
    for (const foreign of [
      'https://elsewhere.example/',
      '//elsewhere.example',
      '/\\elsewhere.example',
      '',
      null,
    ]) {
      expect(safeNext(foreign)).toBeNull();
    }
  });
});
