import { ButtonLink } from '../../components/button-link.tsx';
import { EmptyState } from '../../components/empty-state.tsx';
import { PageHeading } from '../../components/page-heading.tsx';
import { QueryView } from '../../components/query-view.tsx';
import { useRules } from '../../features/rules/api/list-rules.ts';
import { RuleVersionView } from '../../features/rules/components/rule-version-view.tsx';
import { RuleVersionsTable } from '../../features/rules/components/rule-versions-table.tsx';
import { useFormats } from '../../lib/place-context.ts';
import { paths } from '../paths.ts';

/** The versions of the municipality's rule, and the one in force in words. */
export function AdminRulesPage() {
  const formats = useFormats();
  const rules = useRules();
  return (
    <div className="sheet-width grid gap-6 py-8">
      <div className="grid gap-2">
        <PageHeading>The rule and its versions</PageHeading>
        <p className="measure">
          What a proposal is judged by. A study keeps the version that was in force when it was
          computed, and so does every report.
        </p>
      </div>
      <QueryView query={rules} what="the rule">
        {({ rows, mayWrite }) => {
          const inForce = rows.find(({ state }) => state === 'in-force');
          return (
            <>
              {mayWrite ? (
                <div className="no-print">
                  <ButtonLink
                    kind="primary"
                    to={paths.newRule.href(inForce === undefined ? {} : { from: inForce.id })}
                  >
                    {rows.length === 0 ? 'Write the first version' : 'Write a new version'}
                  </ButtonLink>
                </div>
              ) : null}
              {rows.length === 0 ? (
                <EmptyState title="There is no rule yet.">
                  <p>Studies can be computed once a version is in force.</p>
                </EmptyState>
              ) : (
                <RuleVersionsTable versions={rows} />
              )}
              {inForce === undefined ? (
                rows.length === 0 ? null : (
                  <p className="say">No version is in force today: no study can be run.</p>
                )
              ) : (
                <section
                  className="grid gap-4 border-t border-ink pt-5"
                  aria-labelledby="in-force-heading"
                >
                  <div>
                    <h2 id="in-force-heading">
                      In force: {inForce.rule.title}, version {inForce.rule.version}
                    </h2>
                    <p className="text-ink-soft">
                      {inForce.rule.citation === '' ? '' : `${inForce.rule.citation} · `}
                      {inForce.inForceFrom === null
                        ? ''
                        : `since ${formats.date(inForce.inForceFrom)}`}
                    </p>
                  </div>
                  <RuleVersionView rule={inForce.rule} />
                </section>
              )}
            </>
          );
        }}
      </QueryView>
    </div>
  );
}
