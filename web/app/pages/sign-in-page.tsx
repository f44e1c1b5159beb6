import { PageHeading } from '../../components/page-heading.tsx';

export function SignInPage() {
  return (
    <div className="sheet-width py-8">
      <PageHeading>SignIn</PageHeading>
    </div>
  );
}
