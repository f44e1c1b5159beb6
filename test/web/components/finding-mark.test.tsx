import { cleanup, render, screen } from '@testing-library/react';
import { afterEach, describe, expect, it } from 'vitest';
import { FindingMark } from '../../../web/components/finding-mark.tsx';

afterEach(cleanup);

describe('the finding mark', () => {
  it.each([
    ['met', '✓', 'met'],
    ['not-met', '✕', 'not met'],
    ['not-affected', '–', 'not affected'],
  ] as const)('says %s by a sign and by words', (finding, sign, words) => {
    const { container } = render(<FindingMark finding={finding} />);
    expect(container.textContent.replaceAll('\u00a0', ' ')).toBe(`${sign} ${words}`);
  });

  it('hides the sign from screen readers, which read the words', () => {
    render(<FindingMark finding="not-met" />);
    expect(screen.getByText(/✕/).getAttribute('aria-hidden')).toBe('true');
  });

  it('says when a finding is close to the limit', () => {
    const { container } = render(<FindingMark finding="met" close />);
    expect(container.textContent).toContain('(close)');
  });
});
