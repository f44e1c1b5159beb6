import { Button } from '../../../components/button.tsx';

export interface TrialProgressProps {
  done: number;
  /** 0 while it is not known. */
  total: number;
  onCancel: () => void;
}

/** How far a trial is, in instants judged by either version. */
export function TrialProgress({ done, total, onCancel }: TrialProgressProps) {
  return (
    <div className="measure grid gap-3">
      <progress
        className="h-3 w-full appearance-none border border-ink bg-sheet [&::-moz-progress-bar]:bg-ink [&::-webkit-progress-bar]:bg-sheet [&::-webkit-progress-value]:bg-ink"
        aria-label="Instants judged"
        max={Math.max(1, total)}
        value={done}
      />
      <p role="status">
        {total === 0 ? 'The case is being prepared.' : `${done} of ${total} instants judged.`}
      </p>
      <Button className="justify-self-start" onPress={onCancel}>
        Stop
      </Button>
    </div>
  );
}
