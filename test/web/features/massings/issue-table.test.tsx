import { cleanup, screen, within } from '@testing-library/react';
import { afterEach, describe, expect, it } from 'vitest';
import type { MassingIssue } from '../../../../shared/massing/massing-issue.ts';
import { IssueTable } from '../../../../web/features/massings/components/issue-table.tsx';
import { renderInPlace } from '../../support/render-in-place.tsx';

const repaired: MassingIssue = {
  code: 'MASSING_RING_OPEN',
  severity: 'repaired',
  feature: 'tower',
  lngLat: null,
  message: 'A ring was closed.',
  suggestion: '',
};
const wrong: MassingIssue = {
  code: 'MASSING_TOP_BELOW_BASE',
  severity: 'error',
  feature: 'podium',
  lngLat: [-91.3, 46.75],
  message: 'Block podium has its top below its base.',
  suggestion: 'Give both heights in metres.',
};

afterEach(cleanup);

describe('the table of what was found in a massing', () => {
  it('puts what must be corrected first, with its place and the way out', () => {
    renderInPlace(<IssueTable issues={[repaired, wrong]} />);
    const rows = screen.getAllByRole('row');
    const first = within(rows[1] ?? document.body);
    expect(first.getByText(/must be corrected/)).toBeDefined();
    expect(first.getByText('podium')).toBeDefined();
    expect(first.getByText('-91.30000, 46.75000')).toBeDefined();
    expect(first.getByText('Give both heights in metres.')).toBeDefined();
    expect(within(rows[2] ?? document.body).getByText(/put right/)).toBeDefined();
  });

  it('counts in its caption', () => {
    renderInPlace(<IssueTable issues={[repaired, wrong]} />);
    expect(screen.getByRole('table').querySelector('caption')?.textContent).toBe(
      '1 to correct, 1 put right',
    );
  });

  it('says so where there is nothing to remark', () => {
    renderInPlace(<IssueTable issues={[]} />);
    expect(screen.getByText(/read without a remark/)).toBeDefined();
    expect(screen.queryByRole('table')).toBeNull();
  });
});
