/** The diagonal hatch of "lost" and "net new", to be filled with as `url(#id)`. */
export function SunHatch({ id, spacing = 6 }: { id: string; spacing?: number }) {
  return (
    <pattern
      id={id}
      width={spacing}
      height={spacing}
      patternUnits="userSpaceOnUse"
      patternTransform="rotate(45)"
    >
      <rect width={spacing} height={spacing} fill="var(--color-madder)" fillOpacity={0.1} />
      <line y2={spacing} stroke="var(--color-madder)" strokeWidth={spacing / 2.6} />
    </pattern>
  );
}
