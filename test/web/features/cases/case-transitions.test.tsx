import { cleanup, fireEvent, screen } from '@testing-library/react';
import { afterEach, describe, expect, it, vi } from 'vitest';
import type { CaseDetail } from '../../../../shared/contracts/cases.ts';
import { CaseTransitions } from '../../../../web/features/cases/components/case-transitions.tsx';
import { renderInPlace } from '../../support/render-in-place.tsx';
import { stubFetch } from '../../support/stub-fetch.ts';

const draft: CaseDetail = {
  reference: 'draft-abcdefghij',
  number: null,
  title: 'Larkwicket Court',
  address: '26 Larkwicket Street',
  state: 'draft',
  stateSince: '2026-12-01T16:00:00Z',
  applicantName: 'Perrin Calloquist',
  sitePoint: null,
  latestRevision: null,
  heightM: null,
  storeys: null,
  latestStudy: null,
  description: '',
  siteParcels: [],
  site: null,
  correction: null,
  history: [],
  abilities: ['edit'],
  transitions: [
    {
      to: 'submitted',
      label: 'Submit the application',
      needsReason: false,
      obstacle: 'Upload a massing first.',
    },
    { to: 'withdrawn', label: 'Withdraw the application', needsReason: true, obstacle: null },
  ],
};

afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

describe('what an applicant may do next', () => {
  it('says what stands in the way in place of a button', () => {
    renderInPlace(<CaseTransitions reviewCase={draft} onMoved={vi.fn()} />);
    expect(screen.getByText(/Upload a massing first\./)).toBeDefined();
    expect(screen.queryByRole('button', { name: 'Submit the application' })).toBeNull();
  });

  it('asks for the reason where one is needed, and sends nothing without', async () => {
    // jsdom has no CSS object, which the dialog's library asks to escape a name.
    vi.stubGlobal('CSS', { escape: (name: string) => name });
    const sent = stubFetch(200, { ...draft, state: 'withdrawn' });
    renderInPlace(<CaseTransitions reviewCase={draft} onMoved={vi.fn()} />);
    fireEvent.click(screen.getByRole('button', { name: 'Withdraw the application' }));
    const dialog = await screen.findByRole('alertdialog');
    const confirm = Array.from(dialog.querySelectorAll('button')).find(
      ({ textContent }) => textContent === 'Withdraw the application',
    );
    if (confirm === undefined) throw new Error('The dialog has no button to confirm.');
    fireEvent.click(confirm);
    expect(await screen.findByText(/Write the reason\./)).toBeDefined();
    expect(sent).toHaveLength(0);

    fireEvent.change(screen.getByLabelText('Reason'), { target: { value: 'Sold.' } });
    fireEvent.click(confirm);
    await vi.waitFor(() => expect(sent).not.toHaveLength(0));
    expect(sent[0]?.body).toEqual({ to: 'withdrawn', from: 'draft', reason: 'Sold.' });
  });
});
