import { PageHeading } from '../../components/page-heading.tsx';

export function ApplicationsPage() {
  return (
    <div className="sheet-width py-8">
      <PageHeading>Applications</PageHeading>
    </div>
  );
}
