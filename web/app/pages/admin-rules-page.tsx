import { EmptyState } from '../../components/empty-state.tsx';
import { PageHeading } from '../../components/page-heading.tsx';
import { QueryView } from '../../components/query-view.tsx';
import { useRules } from '../../features/rules/api/list-rules.ts';
import { RuleVersionView } from '../../features/rules/components/rule-version-view.tsx';

/** The versions of the municipality's rule, to read. */
export function AdminRulesPage() {
  const rules = useRules();
  return (
    <div className="sheet-width grid gap-6 py-8">
      <div className="grid gap-2">
        <PageHeading>The rule and its versions</PageHeading>
        <p className="measure">
          What a proposal is judged by. A study keeps the version that was in force when it was
          computed.
        </p>
      </div>
      <QueryView query={rules} what="the rule">
        {({ rows }) =>
          rows.length === 0 ? (
            <EmptyState title="There is no rule yet.">
              <p>
                Studies can be computed once a version is in force. It is put in place when the
                server is set up.
              </p>
            </EmptyState>
          ) : (
            rows.map((version) => <RuleVersionView key={version.id} version={version} />)
          )
        }
      </QueryView>
    </div>
  );
}
