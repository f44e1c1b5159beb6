import { useState } from 'react';
import { Link, useNavigate, useParams } from 'react-router-dom';
import type { RuleVersion } from '../../../../shared/contracts/rules.ts';
import { PageHeading } from '../../../components/page-heading.tsx';
import { QueryView } from '../../../components/query-view.tsx';
import { useToast } from '../../../components/toast.tsx';
import { useRule } from '../../../features/rules/api/get-rule.ts';
import { useChangeRuleDraft } from '../../../features/rules/api/write-rule.ts';
import { RuleForm } from '../../../features/rules/components/rule-form.tsx';
import { draftOfRule } from '../../../features/rules/rule-draft.ts';
import { isApiError } from '../../../lib/api-error.ts';
import { paths } from '../../paths.ts';
import { NotFoundPage } from '../not-found-page.tsx';
import { UnsavedGuard } from './unsaved-guard.tsx';

/** Work on a version that has not come into force. */
export function RuleEditPage() {
  const { id = '' } = useParams();
  const rule = useRule(id);
  if (isApiError(rule.error, 'NOT_FOUND')) return <NotFoundPage />;
  return (
    <div className="sheet-width grid gap-6 py-8">
      <QueryView query={rule} what="the draft">
        {(version) =>
          version.abilities.includes('change') ? (
            <Draft key={version.id} version={version} />
          ) : (
            <div className="grid gap-3">
              <PageHeading>{`Version ${version.rule.version} stays as it is`}</PageHeading>
              <p className="measure">
                It is or was in force, and studies were judged by it.{' '}
                <Link to={paths.newRule.href({ from: version.id })} className="link">
                  Make a new version from it
                </Link>
                .
              </p>
            </div>
          )
        }
      </QueryView>
    </div>
  );
}

function Draft({ version }: { version: RuleVersion }) {
  const navigate = useNavigate();
  const showToast = useToast();
  const change = useChangeRuleDraft(version);
  const [isDirty, setIsDirty] = useState(false);
  const [initial] = useState(() => draftOfRule(version.rule));
  const { rule } = version;
  return (
    <>
      <PageHeading>{`Edit version ${rule.version}`}</PageHeading>
      <RuleForm
        initial={initial}
        identity={{ id: rule.id, version: rule.version }}
        submitLabel="Save the draft"
        isPending={change.isPending}
        error={change.error}
        onDirtyChange={setIsDirty}
        onSubmit={(written) =>
          change.mutate(written, {
            onSuccess: () => {
              showToast('The draft is saved.');
              void navigate(paths.rule.href(version.id));
            },
          })
        }
      />
      <UnsavedGuard isUnsaved={isDirty && !change.isPending && !change.isSuccess} />
    </>
  );
}
