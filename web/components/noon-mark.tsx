export interface NoonMarkProps {
  /** How high the sun stands at noon today, degrees above the horizon. */
  noonAltitudeDeg: number;
  className?: string;
}

const top = 1;
const bottom = 21;

/** The mark: a vertical hairline crossed by a short bar at the height of the noon sun. */
export function NoonMark({ noonAltitudeDeg, className = '' }: NoonMarkProps) {
  const share = Math.min(90, Math.max(0, noonAltitudeDeg)) / 90;
  const y = bottom - share * (bottom - top);
  return (
    <svg
      viewBox="0 0 20 22"
      width="20"
      height="22"
      aria-hidden="true"
      className={`shrink-0 ${className}`}
      stroke="currentColor"
      strokeWidth="1.6"
    >
      <path d={`M10 ${top}V${bottom}M5 ${y.toFixed(2)}H15`} fill="none" />
    </svg>
  );
}
