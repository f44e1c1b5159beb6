import { useMemo } from 'react';
import type { StudyDetail } from '../../../../shared/contracts/studies.ts';
import { Button } from '../../../components/button.tsx';
import { ReceptorAccount } from './receptor-account.tsx';

export interface LedgerOfReceptorProps {
  study: StudyDetail;
  receptor: string;
  onClose: () => void;
}

/** The sun ledger of one receptor, opened from the table of findings. */
export function LedgerOfReceptor({ study, receptor, onClose }: LedgerOfReceptorProps) {
  const judged = useMemo(
    () => study.rule.clauses.flatMap((clause) => clause.days),
    [study.rule.clauses],
  );
  return (
    <div className="grid gap-3 border-y border-ink py-5">
      <ReceptorAccount
        key={receptor}
        studyId={study.id}
        receptor={receptor}
        judged={judged}
        shouldTakeFocus
      />
      <Button className="no-print justify-self-start" onPress={onClose}>
        Close the sun ledger
      </Button>
    </div>
  );
}
