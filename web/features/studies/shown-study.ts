import type { StudyDetail } from '../../../shared/contracts/studies.ts';

/** The finished studies, one for each revision: the latest of it; the latest revision first. */
export function finishedStudies(studies: readonly StudyDetail[]): StudyDetail[] {
  const latest = new Map<number, StudyDetail>();
  for (const study of studies) {
    if (study.status !== 'finished') continue;
    const known = latest.get(study.revision);
    if (known === undefined || known.requestedAt < study.requestedAt) {
      latest.set(study.revision, study);
    }
  }
  return [...latest.values()].toSorted((a, b) => b.revision - a.revision);
}

/** The study to show: of the revision that the address names, else of the latest that has one. */
export function chooseStudy(
  finished: readonly StudyDetail[],
  revision: string | null,
): StudyDetail | null {
  const wanted = finished.find((study) => String(study.revision) === revision);
  return wanted ?? finished[0] ?? null;
}
