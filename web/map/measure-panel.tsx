import type { LngLat } from '../../shared/geometry/geojson-schema.ts';
import { Button } from '../components/button.tsx';
import { useFormats } from '../lib/place-context.ts';
import { stretchesM } from './measured-line.ts';

export interface MeasurePanelProps {
  points: readonly LngLat[];
  onTakeBack: () => void;
  onDone: () => void;
}

/** What has been measured so far, and how to go on; the line itself is drawn on the map. */
export function MeasurePanel({ points, onTakeBack, onDone }: MeasurePanelProps) {
  const { length } = useFormats();
  const stretches = stretchesM(points);
  const totalM = stretches.reduce((sum, one) => sum + one, 0);
  const last = stretches.at(-1);
  return (
    <div
      role="group"
      aria-label="Measuring"
      className="no-print absolute start-2 top-2 grid max-w-64 gap-1 border border-ink bg-sheet p-2 text-small"
    >
      <p role="status">
        {last === undefined ? (
          points.length === 0 ? (
            'Point at where the distance begins.'
          ) : (
            'Point at where it ends.'
          )
        ) : (
          <>
            <strong>{length(totalM)}</strong>
            {stretches.length === 1 ? '' : `, the last stretch ${length(last)}`}
          </>
        )}
      </p>
      <p className="text-ink-soft">
        With the keyboard: arrows move the map, Enter sets a point at the cross.
      </p>
      <div className="flex flex-wrap gap-x-4">
        <Button kind="plain" isDisabled={points.length === 0} onPress={onTakeBack}>
          Take back a point
        </Button>
        <Button kind="plain" onPress={onDone}>
          Done
        </Button>
      </div>
    </div>
  );
}
