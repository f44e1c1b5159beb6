import { useState } from 'react';
import type { RuleVersion } from '../../../../shared/contracts/rules.ts';
import { Button } from '../../../components/button.tsx';
import { Dialog } from '../../../components/dialog.tsx';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { TextField } from '../../../components/text-field.tsx';
import { isApiError } from '../../../lib/api-error.ts';
import { useFormats } from '../../../lib/place-context.ts';

export interface EnactDialogProps {
  version: RuleVersion;
  isPending: boolean;
  error: unknown;
  onConfirm: (inForceFrom: string) => void;
  onCancel: () => void;
}

/** Asks from which day a version holds, and says what that means. */
export function EnactDialog({ version, isPending, error, onConfirm, onCancel }: EnactDialogProps) {
  const formats = useFormats();
  const [today] = useState(() => formats.civil.civilDateOf(new Date().toISOString()));
  const [day, setDay] = useState(today);
  const dayProblem = isApiError(error, 'INPUT_INVALID')
    ? error.problem.errors?.find(({ path }) => path === 'inForceFrom')?.message
    : undefined;
  return (
    <Dialog
      role="alertdialog"
      title={`Put version ${version.rule.version} in force?`}
      isOpen
      onOpenChange={(isOpen) => {
        if (!isOpen) onCancel();
      }}
    >
      <p>
        Studies that are run from that day on are judged by it. Earlier studies and reports keep the
        version that they were judged by. Once it has come into force it can no longer be changed.
      </p>
      <TextField
        label="In force from"
        type="date"
        value={day}
        onChange={setDay}
        problem={
          dayProblem ?? (day !== '' && day < today ? 'Choose today or a later day.' : undefined)
        }
      />
      {error !== null && dayProblem === undefined ? <ProblemNotice error={error} /> : null}
      <div className="flex flex-wrap justify-end gap-3">
        <Button onPress={onCancel}>Leave it as it is</Button>
        <Button
          kind="primary"
          isPending={isPending}
          isDisabled={day === '' || day < today}
          onPress={() => onConfirm(day)}
        >
          Put it in force
        </Button>
      </div>
    </Dialog>
  );
}
