import { Button } from '../../../components/button.tsx';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { useRequestStudy } from '../api/request-study.ts';

export interface RequestStudyButtonProps {
  reference: string;
  label: string;
}

/** Runs the study of the current massing under the rule in force. */
export function RequestStudyButton({ reference, label }: RequestStudyButtonProps) {
  const requestStudy = useRequestStudy(reference);
  return (
    <div className="grid justify-items-start gap-2">
      <Button
        kind="primary"
        isPending={requestStudy.isPending}
        onPress={() => requestStudy.mutate()}
      >
        {label}
      </Button>
      {requestStudy.isError ? <ProblemNotice error={requestStudy.error} /> : null}
    </div>
  );
}
