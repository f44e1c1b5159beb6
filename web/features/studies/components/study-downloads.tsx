/** The study's figures and the file with which anyone can recompute it. */
export function StudyDownloads({ studyId }: { studyId: string }) {
  const files = [
    { href: `/api/studies/${studyId}/receptors.csv`, label: 'Findings as CSV' },
    { href: `/api/studies/${studyId}/receptors.geojson`, label: 'Findings as GeoJSON' },
    { href: `/api/studies/${studyId}/evidence`, label: 'Evidence file' },
  ];
  return (
    <ul className="flex flex-wrap gap-x-5 gap-y-1 text-small">
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
