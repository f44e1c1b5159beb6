import { useState } from 'react';
import { Link, useParams } from 'react-router-dom';
import type { CaseDetail } from '../../../../shared/contracts/cases.ts';
import type { RuleVersion } from '../../../../shared/contracts/rules.ts';
import { Button } from '../../../components/button.tsx';
import { PageHeading } from '../../../components/page-heading.tsx';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { QueryView } from '../../../components/query-view.tsx';
import { useCase } from '../../../features/cases/api/get-case.ts';
import { useCases } from '../../../features/cases/api/list-cases.ts';
import { useRule } from '../../../features/rules/api/get-rule.ts';
import { useRuleTrial } from '../../../features/rules/api/try-rule.ts';
import { CasePicker } from '../../../features/rules/components/case-picker.tsx';
import { RuleTrialView } from '../../../features/rules/components/rule-trial-view.tsx';
import { TrialProgress } from '../../../features/rules/components/trial-progress.tsx';
import { isApiError } from '../../../lib/api-error.ts';
import { useSearchState } from '../../../lib/use-search-state.ts';
import { paths } from '../../paths.ts';
import { NotFoundPage } from '../not-found-page.tsx';

/** A version tried on an earlier case, beside the one in force; nothing is stored. */
export function RuleTrialPage() {
  const { id = '' } = useParams();
  const rule = useRule(id);
  if (isApiError(rule.error, 'NOT_FOUND')) return <NotFoundPage />;
  return (
    <div className="sheet-width grid gap-6 py-8">
      <QueryView query={rule} what="the version">
        {(version) => <Trial version={version} />}
      </QueryView>
    </div>
  );
}

function Trial({ version }: { version: RuleVersion }) {
  const [reference, setReference] = useSearchState('case');
  const [words, setWords] = useState('');
  const cases = useCases({ view: 'desk', pageSize: 100, ...(words === '' ? {} : { q: words }) });
  return (
    <>
      <div className="grid gap-2">
        <p className="no-print">
          <Link to={paths.rule.href(version.id)} className="link">
            Back to version {version.rule.version}
          </Link>
        </p>
        <PageHeading>{`Try version ${version.rule.version} on a case`}</PageHeading>
        <p className="measure">
          An earlier case is judged by this version beside the one in force. Nothing is stored, and
          nothing changes for anybody. It uses the buildings and receptors that the case’s latest
          study was computed with.
        </p>
      </div>
      <div className="no-print">
        <CasePicker
          cases={cases.data?.rows ?? []}
          isLoading={cases.isFetching}
          onSearch={setWords}
          onPick={(picked) => setReference(picked.reference)}
        />
      </div>
      {reference === null ? null : (
        <PickedCase key={reference} version={version} reference={reference} />
      )}
    </>
  );
}

function PickedCase({ version, reference }: { version: RuleVersion; reference: string }) {
  const reviewCase = useCase(reference);
  return (
    <QueryView query={reviewCase} what="the case">
      {(detail) => <TrialOnCase version={version} reviewCase={detail} />}
    </QueryView>
  );
}

function TrialOnCase({ version, reviewCase }: { version: RuleVersion; reviewCase: CaseDetail }) {
  const { state, start, cancel } = useRuleTrial();
  const { latestStudy, title, reference } = reviewCase;
  const name = `${reference} ${title}`;
  if (latestStudy?.status !== 'finished') {
    return <p className="say">Case {name} has no finished study to try a rule on.</p>;
  }
  return (
    <section className="grid gap-5 border-t border-ink pt-5" aria-labelledby="trial-heading">
      <h2 id="trial-heading">{name}</h2>
      {state.status === 'running' ? (
        <TrialProgress done={state.done} total={state.total} onCancel={cancel} />
      ) : (
        <Button
          kind={state.status === 'done' ? 'secondary' : 'primary'}
          className="no-print justify-self-start"
          onPress={() => void start({ study: latestStudy.id, rule: version.rule })}
        >
          {state.status === 'done' ? 'Try it again' : 'Try it on this case'}
        </Button>
      )}
      {state.status === 'failed' ? <ProblemNotice error={state.error} /> : null}
      {state.status === 'done' ? <RuleTrialView trial={state.trial} /> : null}
    </section>
  );
}
