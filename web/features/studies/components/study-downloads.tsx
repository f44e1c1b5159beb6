export interface StudyDownloadsProps {
  studyId: string;
  /** The filters of the findings table, for files of the same rows. */
  filter?: Partial<Record<'q' | 'finding' | 'clause' | 'class' | 'sort', string>>;
}

/** The study's figures, and the file with which anyone can recompute it. */
export function StudyDownloads({ studyId, filter = {} }: StudyDownloadsProps) {
  const query = new URLSearchParams(filter).toString();
  const search = query === '' ? '' : `?${query}`;
  const files = [
    { href: `/api/studies/${studyId}/receptors.csv${search}`, label: 'Findings as CSV' },
    { href: `/api/studies/${studyId}/receptors.geojson${search}`, label: 'Findings as GeoJSON' },
    { href: `/api/studies/${studyId}/evidence`, label: 'Evidence file' },
  ];
  return (
    <ul className="flex flex-wrap gap-x-5 gap-y-1 text-small" aria-label="Files to download">
      {files.map(({ href, label }) => (
        <li key={href}>
          <a href={href} download className="link">
            {label}
          </a>
        </li>
      ))}
    </ul>
  );
}
