import { Link, useNavigate, useParams } from 'react-router-dom';
import type { RuleVersion } from '../../../../shared/contracts/rules.ts';
import { PageHeading } from '../../../components/page-heading.tsx';
import { QueryView } from '../../../components/query-view.tsx';
import { useToast } from '../../../components/toast.tsx';
import { useRule } from '../../../features/rules/api/get-rule.ts';
import { useRules } from '../../../features/rules/api/list-rules.ts';
import { RuleActions } from '../../../features/rules/components/rule-actions.tsx';
import { RuleDifferences } from '../../../features/rules/components/rule-differences.tsx';
import { RuleVersionView } from '../../../features/rules/components/rule-version-view.tsx';
import { versionStateWords } from '../../../features/rules/rule-words.ts';
import { isApiError } from '../../../lib/api-error.ts';
import { useFormats } from '../../../lib/place-context.ts';
import { useSearchState } from '../../../lib/use-search-state.ts';
import { paths } from '../../paths.ts';
import { NotFoundPage } from '../not-found-page.tsx';

/** One version of the rule: what it says, in what it differs, and what may be done with it. */
export function RulePage() {
  const { id = '' } = useParams();
  const rule = useRule(id);
  if (isApiError(rule.error, 'NOT_FOUND')) return <NotFoundPage />;
  return (
    <div className="sheet-width grid gap-6 py-8">
      <p className="no-print">
        <Link to={paths.adminRules.href()} className="link">
          All versions
        </Link>
      </p>
      <QueryView query={rule} what="the version">
        {(version) => <Version key={version.id} version={version} />}
      </QueryView>
    </div>
  );
}

function Version({ version }: { version: RuleVersion }) {
  const formats = useFormats();
  const navigate = useNavigate();
  const showToast = useToast();
  const rules = useRules();
  const [against, setAgainst] = useSearchState('against');
  const { rule, state, inForceFrom } = version;
  const others = rules.data?.rows.filter(({ id }) => id !== version.id) ?? [];
  const compared =
    others.find(({ id }) => id === against) ??
    others.find((one) => one.state === 'in-force') ??
    others.find((one) => one.rule.version < rule.version) ??
    others[0];
  return (
    <>
      <div className="grid gap-2">
        <PageHeading>{`${rule.title}, version ${rule.version}`}</PageHeading>
        <p className="text-ink-soft">
          {rule.citation === '' ? '' : `${rule.citation} · `}
          <strong>{versionStateWords[state]}</strong>
          {inForceFrom === null ? '' : `, ${formats.date(inForceFrom)}`}
          {describeDeeds(version, formats.dateOfInstant)}
        </p>
      </div>
      <RuleActions
        version={version}
        onEnacted={(enacted) =>
          showToast(
            enacted.state === 'in-force'
              ? `Version ${rule.version} is in force from today.`
              : `Version ${rule.version} comes into force on ${formats.date(enacted.inForceFrom ?? '')}.`,
          )
        }
        onDiscarded={() => {
          showToast(`Version ${rule.version} is thrown away.`);
          void navigate(paths.adminRules.href());
        }}
      />
      <section className="grid gap-4 border-t border-ink pt-5" aria-labelledby="says-heading">
        <h2 id="says-heading">What it says</h2>
        <RuleVersionView rule={rule} />
      </section>
      {compared === undefined ? null : (
        <section className="grid gap-4 border-t border-ink pt-5" aria-labelledby="differs-heading">
          <h2 id="differs-heading">In what it differs from version {compared.rule.version}</h2>
          <RuleDifferences
            version={version}
            others={others}
            against={compared}
            onChoose={setAgainst}
          />
        </section>
      )}
    </>
  );
}

function describeDeeds(
  { created, changed, enacted }: RuleVersion,
  day: (at: string) => string,
): string {
  const say = (words: string, deed: RuleVersion['changed']) =>
    deed === null ? [] : [`${words} ${day(deed.at)}${deed.by === null ? '' : ` by ${deed.by}`}`];
  return [...say('written', created), ...say('changed', changed), ...say('put in force', enacted)]
    .map((one) => ` · ${one}`)
    .join('');
}
