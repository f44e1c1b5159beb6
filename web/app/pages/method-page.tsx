import { PageHeading } from '../../components/page-heading.tsx';

export function MethodPage() {
  return (
    <div className="sheet-width py-8">
      <PageHeading>Method</PageHeading>
    </div>
  );
}
