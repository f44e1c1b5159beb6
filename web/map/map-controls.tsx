import type { ReactNode } from 'react';

export interface MapControlsProps {
  onZoomIn: () => void;
  onZoomOut: () => void;
  onShowWhole: () => void;
  /** Absent where the map stays a plan. */
  tilt: { isTilted: boolean; onTilt: () => void; onTurn: (byDeg: number) => void } | null;
  /** Absent where nothing is measured. */
  measure: { isMeasuring: boolean; onMeasure: () => void } | null;
}

const turnDeg = 45;

/** The map's buttons, one under the other. */
export function MapControls({ onZoomIn, onZoomOut, onShowWhole, tilt, measure }: MapControlsProps) {
  return (
    <div className="no-print absolute end-2 top-2 grid border border-ink bg-sheet">
      <MapButton label="Zoom in" onPress={onZoomIn}>
        +
      </MapButton>
      <MapButton label="Zoom out" onPress={onZoomOut}>
        −
      </MapButton>
      <MapButton label="Show the whole again" onPress={onShowWhole}>
        <Sign d="M1 5V1h4M9 1h4v4M13 9v4H9M5 13H1V9" />
      </MapButton>
      {tilt === null ? null : (
        <MapButton
          label={tilt.isTilted ? 'Show the plan from above' : 'Tilt the view'}
          onPress={tilt.onTilt}
        >
          <Sign
            d={tilt.isTilted ? 'M2 2h10v10H2z' : 'M1 12L4 6h9l-3 6zM4 6V2M13 6V2M4 2h9M10 12V8'}
          />
        </MapButton>
      )}
      {tilt?.isTilted === true ? (
        <>
          <MapButton label="Look from further left" onPress={() => tilt.onTurn(turnDeg)}>
            <Sign d="M12 11A6 6 0 1 0 2 8M2 12V8h4" />
          </MapButton>
          <MapButton label="Look from further right" onPress={() => tilt.onTurn(-turnDeg)}>
            <Sign d="M2 11A6 6 0 1 1 12 8M12 12V8H8" />
          </MapButton>
        </>
      ) : null}
      {measure === null ? null : (
        <MapButton
          label="Measure a distance"
          isPressed={measure.isMeasuring}
          onPress={measure.onMeasure}
        >
          <Sign d="M1 9L9 1l4 4-8 8zM4 6l2 2M6 4l1.5 1.5M8 2l2 2" />
        </MapButton>
      )}
    </div>
  );
}

function Sign({ d }: { d: string }) {
  return (
    <svg
      width="14"
      height="14"
      stroke="currentColor"
      strokeWidth="1.4"
      fill="none"
      aria-hidden="true"
    >
      <path d={d} />
    </svg>
  );
}

interface MapButtonProps {
  label: string;
  isPressed?: boolean;
  onPress: () => void;
  children: ReactNode;
}

function MapButton({ label, isPressed, onPress, children }: MapButtonProps) {
  return (
    <button
      type="button"
      title={label}
      aria-label={label}
      aria-pressed={isPressed}
      onClick={onPress}
      className="grid size-8 cursor-pointer place-items-center border-b border-hairline text-lead leading-none last:border-b-0 hover:bg-ink/5 aria-pressed:bg-ink aria-pressed:text-paper"
    >
      {children}
    </button>
  );
}
