import { PageHeading } from '../../components/page-heading.tsx';

export function HearingsPage() {
  return (
    <div className="sheet-width py-8">
      <PageHeading>Hearings</PageHeading>
    </div>
  );
}
