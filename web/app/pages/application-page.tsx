import { PageHeading } from '../../components/page-heading.tsx';

export function ApplicationPage() {
  return (
    <div className="sheet-width py-8">
      <PageHeading>Application</PageHeading>
    </div>
  );
}
