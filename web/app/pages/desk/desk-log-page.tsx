import { CaseHistory } from '../../../features/cases/components/case-history.tsx';
import { useDeskCase } from './desk-case-page.tsx';

/** What happened with the case, with the reasons that were given. */
export function DeskLogPage() {
  const { history } = useDeskCase();
  return (
    <section className="grid gap-3" aria-labelledby="log-heading">
      <h2 id="log-heading">What has happened</h2>
      <CaseHistory history={history} />
    </section>
  );
}
