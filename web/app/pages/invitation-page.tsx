import { PageHeading } from '../../components/page-heading.tsx';

export function InvitationPage() {
  return (
    <div className="sheet-width py-8">
      <PageHeading>Invitation</PageHeading>
    </div>
  );
}
