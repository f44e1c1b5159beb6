import { describe, expect, it } from 'vitest';
import type { CaseSummary } from '../../../../shared/contracts/cases.ts';
import { daysSince, nextStepOf } from '../../../../web/features/cases/next-step.ts';

type Study = NonNullable<CaseSummary['latestStudy']>;

const study = (status: Study['status'], revision = 2): Study => ({
  id: '00000000-0000-4000-8000-000000000000',
  revision,
  status,
  met: null,
  receptorsNotMet: null,
  lossIndex: null,
});
const underReview = (latestStudy: Study | null) =>
  nextStepOf({ state: 'under-review', latestRevision: 2, latestStudy });

describe('what comes next for a case', () => {
  it('is the study where none has judged the current massing', () => {
    expect(underReview(null).words).toBe('Run the study');
    expect(underReview(study('finished', 1)).words).toBe('Run the study');
  });

  it('is reading it once it has finished, and running it again once it has failed', () => {
    expect(underReview(study('finished')).words).toBe('Read the study, then publish');
    expect(underReview(study('failed')).words).toBe('Run the study again');
    expect(underReview(study('running')).words).toBe('The study is running');
  });

  it('is nothing for the department while the applicant corrects', () => {
    const step = nextStepOf({ state: 'sent-back', latestRevision: 1, latestStudy: null });
    expect(step.isWaiting).toBe(true);
  });
});

describe('daysSince', () => {
  it('counts whole days and none on the first', () => {
    const nowMs = Date.parse('2026-12-03T12:00:00Z');
    expect(daysSince('2026-12-03T09:00:00Z', nowMs)).toBe(0);
    expect(daysSince('2026-12-01T12:00:00Z', nowMs)).toBe(2);
    expect(daysSince('2026-12-04T00:00:00Z', nowMs)).toBe(0);
  });
});
