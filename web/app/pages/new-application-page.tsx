import { PageHeading } from '../../components/page-heading.tsx';

export function NewApplicationPage() {
  return (
    <div className="sheet-width py-8">
      <PageHeading>NewApplication</PageHeading>
    </div>
  );
}
