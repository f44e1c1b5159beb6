import { cleanup, fireEvent, screen, within } from '@testing-library/react';
import { afterEach, describe, expect, it } from 'vitest';
import type {
  RuleTrial,
  TrialFinding,
  TrialRow,
} from '../../../../shared/contracts/rule-trials.ts';
import { RuleTrialView } from '../../../../web/features/rules/components/rule-trial-view.tsx';
import { renderInPlace, withPlainSpaces } from '../../support/render-in-place.tsx';

afterEach(cleanup);

function finding(change: Partial<TrialFinding> = {}): TrialFinding {
  return {
    day: '2026-12-21',
    finding: 'met',
    close: false,
    unit: 'h',
    before: 4,
    after: 3,
    limit: 2,
    margin: 1,
    band: null,
    sentence: 'A sentence.',
    ...change,
  };
}

function row(change: Partial<TrialRow>): TrialRow {
  return {
    receptor: 'N-1',
    label: '1 Test Row',
    class: 'parcel',
    clause: 'noon',
    clauseTitle: 'Noon hours',
    change: 'same',
    inForce: finding(),
    draft: finding(),
    ...change,
  };
}

const trial: RuleTrial = {
  study: '00000000-0000-4000-8000-000000000001',
  caseReference: '2026-0001',
  revision: 1,
  year: 2026,
  inForce: { title: 'Sun', version: 1, met: true, lossIndex: 4 },
  draft: { title: 'Sun', version: 2, met: false, lossIndex: 6.5 },
  clauses: [
    {
      clause: 'noon',
      title: 'Noon hours',
      inForce: { finding: 'met', judged: 2, notMet: 0 },
      draft: { finding: 'not-met', judged: 2, notMet: 1 },
    },
    {
      clause: 'spring',
      title: 'Spring hours',
      inForce: null,
      draft: { finding: 'no-receptor', judged: 0, notMet: 0 },
    },
  ],
  rows: [
    row({ change: 'worse', draft: finding({ finding: 'not-met', limit: 3.5, margin: -0.5 }) }),
    row({ receptor: 'N-2', label: '2 Test Row' }),
    row({
      receptor: 'N-3',
      label: '3 Test Row',
      clause: 'spring',
      change: 'finding',
      inForce: null,
    }),
  ],
};

const rowsShown = () =>
  within(screen.getByRole('table', { name: /Findings by the version/ }))
    .getAllByRole('rowheader')
    .map((one) => one.textContent);

describe('a rule tried on a case', () => {
  it('says what it comes to, and puts the two versions side by side', () => {
    renderInPlace(<RuleTrialView trial={trial} />);
    expect(
      screen.getByText(/meets version 1, which is in force, and does not meet version 2/),
    ).toBeDefined();
    expect(screen.getByText(/1 finding would turn to not met/)).toBeDefined();
    const clauses = screen.getByRole('table', { name: 'Clause by clause' });
    expect(withPlainSpaces(clauses.textContent)).toContain('not met, 1 of 2 not met');
    expect(clauses.textContent).toContain('has no such clause');
    expect(clauses.textContent).toContain('nothing to judge');
    const first = screen.getByRole('row', { name: /1 Test Row/ });
    expect(withPlainSpaces(first.textContent)).toContain(
      '4 h 00 min before, 3 h 00 min after; limit 3 h 30 min',
    );
  });

  it('shows what changes, and all of it when asked', () => {
    renderInPlace(<RuleTrialView trial={trial} />);
    expect(rowsShown()).toEqual(['1 Test RowNoon hours', '3 Test RowNoon hours']);
    fireEvent.click(screen.getByLabelText('Also what stays the same'));
    expect(rowsShown()).toHaveLength(3);
    fireEvent.change(screen.getByLabelText('Find a receptor'), { target: { value: 'n-2' } });
    expect(rowsShown()).toEqual(['2 Test RowNoon hours']);
  });
});
