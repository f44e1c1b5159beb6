import { PageHeading } from '../../components/page-heading.tsx';

export function AdminRulesPage() {
  return (
    <div className="sheet-width py-8">
      <PageHeading>AdminRules</PageHeading>
    </div>
  );
}
