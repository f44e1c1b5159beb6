import { PageHeading } from '../../components/page-heading.tsx';

export function HomePage() {
  return (
    <div className="sheet-width py-8">
      <PageHeading>Home</PageHeading>
    </div>
  );
}
