import type { CaseSummary } from '../../../../shared/contracts/cases.ts';
import { FindingMark } from '../../../components/finding-mark.tsx';

export interface CaseFindingProps {
  study: CaseSummary['latestStudy'];
}

/** The latest study's outcome in a few words. */
export function CaseFinding({ study }: CaseFindingProps) {
  if (study === null) return <span className="text-ink-soft">no study yet</span>;
  if (study.status !== 'finished' || study.met === null) {
    return <span className="text-ink-soft">study not finished</span>;
  }
  if (study.met) return <FindingMark finding="met" />;
  const count = study.receptorsNotMet ?? 0;
  return (
    <>
      <FindingMark finding="not-met" /> at {count} {count === 1 ? 'place' : 'places'}
    </>
  );
}
