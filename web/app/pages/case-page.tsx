import { PageHeading } from '../../components/page-heading.tsx';

export function CasePage() {
  return (
    <div className="sheet-width py-8">
      <PageHeading>Case</PageHeading>
    </div>
  );
}
