import { useFormats } from '../lib/place-context.ts';

export interface TitleBlockProps {
  /** Case number or key. */
  caseReference: string;
  revision: number | null;
  /** `sha256:…`; null where nothing has been computed. */
  studyDigest: string | null;
  /** The instant that is drawn, RFC 3339; null where no shadow is drawn. */
  at: string | null;
  azimuthDeg: number | null;
  altitudeDeg: number | null;
}

/** What a drawing says of itself: case, revision, study, date, civil time, where the sun stands. */
export function TitleBlock({
  caseReference,
  revision,
  studyDigest,
  at,
  azimuthDeg,
  altitudeDeg,
}: TitleBlockProps) {
  const formats = useFormats();
  const cell = 'border border-ink/60 px-2 py-0.5';
  return (
    <table className="border-collapse border border-ink bg-sheet text-[0.75rem] leading-snug">
      <caption className="sr-only">Title block of the map</caption>
      <tbody>
        <tr>
          <td className={cell}>
            {caseReference}
            {revision === null ? '' : ` · revision ${revision}`}
          </td>
          <td className={cell}>
            {studyDigest === null ? 'no study' : `study ${shortDigest(studyDigest)}`}
          </td>
        </tr>
        {at === null ? null : (
          <tr>
            <td className={cell}>{formats.dateOfInstant(at)}</td>
            <td className={cell}>{formats.clockWithZone(at)}</td>
          </tr>
        )}
        {azimuthDeg === null || altitudeDeg === null ? null : (
          <tr>
            <td className={cell}>sun {formats.angle(azimuthDeg)} from north</td>
            <td className={cell}>{formats.angle(altitudeDeg)} high</td>
          </tr>
        )}
      </tbody>
    </table>
  );
}

/** `7f3a 91c2` of `sha256:7f3a91c2…` */
export function shortDigest(digest: string): string {
  const hex = digest.replace(/^sha256:/, '');
  return `${hex.slice(0, 4)} ${hex.slice(4, 8)}`;
}
