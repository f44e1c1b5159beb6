import { useFormats } from '../../../lib/place-context.ts';
import type { JudgedWindow } from '../../../map/study-view.ts';

/** Which hours of the chosen day the rule judges; every other hour can be looked at as well. */
export function JudgedHoursNote({ windows }: { windows: readonly JudgedWindow[] }) {
  const { clock } = useFormats();
  const time = (ms: number) => clock(new Date(ms).toISOString());
  const spans = windows.map(({ fromMs, toMs }) => `from ${time(fromMs)} to ${time(toMs)}`);
  return (
    <p className="text-small text-ink-soft">
      {spans.length === 0
        ? 'The rule judges no hour of this day.'
        : `The hours ${spans.join(', and ')} are judged by the rule.`}
    </p>
  );
}
