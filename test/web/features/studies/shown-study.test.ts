import { describe, expect, it } from 'vitest';
import type { StudyDetail } from '../../../../shared/contracts/studies.ts';
import { chooseStudy, finishedStudies } from '../../../../web/features/studies/shown-study.ts';

const study = (
  id: string,
  revision: number,
  requestedAt: string,
  status: StudyDetail['status'] = 'finished',
): StudyDetail => ({
  id,
  caseReference: '2026-0001',
  revision,
  status,
  instantsDone: 0,
  instantsTotal: 0,
  requestedAt,
  finishedAt: null,
  failure: null,
  engine: null,
  digest: null,
  isCurrent: false,
  year: 2026,
  timeZone: 'America/Chicago',
  rule: { title: '', version: 1, citation: '', clauses: [] },
  keyDates: [],
  findings: null,
  instants: [],
});

const studies = [
  study('d', 2, '2026-12-04T00:00:00Z', 'running'),
  study('c', 1, '2026-12-03T00:00:00Z'),
  study('b', 2, '2026-12-02T00:00:00Z'),
  study('a', 1, '2026-12-01T00:00:00Z'),
];

describe('the study that is shown', () => {
  it('is a finished one, one for each revision, the latest revision first', () => {
    expect(finishedStudies(studies).map(({ id }) => id)).toEqual(['b', 'c']);
  });

  it('is the one of the revision in the address, else of the latest', () => {
    const finished = finishedStudies(studies);
    expect(chooseStudy(finished, '1')?.id).toBe('c');
    expect(chooseStudy(finished, null)?.id).toBe('b');
    expect(chooseStudy(finished, '9')?.id).toBe('b');
    expect(chooseStudy([], null)).toBeNull();
  });
});
