import { useState } from 'react';
import { useNavigate } from 'react-router-dom';
import type { RuleVersion } from '../../../../shared/contracts/rules.ts';
import { ruleSchema } from '../../../../shared/rules/rule-schema.ts';
import { PageHeading } from '../../../components/page-heading.tsx';
import { QueryView } from '../../../components/query-view.tsx';
import { useToast } from '../../../components/toast.tsx';
import { useRules } from '../../../features/rules/api/list-rules.ts';
import { useCreateRuleDraft } from '../../../features/rules/api/write-rule.ts';
import { RuleForm } from '../../../features/rules/components/rule-form.tsx';
import { draftOfRule, type RuleDraft } from '../../../features/rules/rule-draft.ts';
import { useSearchState } from '../../../lib/use-search-state.ts';
import { paths } from '../../paths.ts';
import { UnsavedGuard } from './unsaved-guard.tsx';

/** The next version of the rule, from an earlier one or from nothing. */
export function NewRulePage() {
  const rules = useRules();
  const [from] = useSearchState('from');
  return (
    <div className="sheet-width grid gap-6 py-8">
      <QueryView query={rules} what="the rule">
        {({ rows }) => {
          const source = rows.find(({ id }) => id === from) ?? null;
          return <NewRule key={source?.id ?? 'none'} source={source} versions={rows} />;
        }}
      </QueryView>
    </div>
  );
}

const firstId = 'solar-access';
const emptyDraft: RuleDraft = {
  title: '',
  citation: '',
  clauses: [],
  // The schema's own names for a loss.
  bands: ruleSchema.shape.bands.parse(undefined),
};

interface NewRuleProps {
  source: RuleVersion | null;
  versions: readonly RuleVersion[];
}

function NewRule({ source, versions }: NewRuleProps) {
  const navigate = useNavigate();
  const showToast = useToast();
  const create = useCreateRuleDraft();
  const [isDirty, setIsDirty] = useState(false);
  const [initial] = useState(() => (source === null ? emptyDraft : draftOfRule(source.rule)));
  const identity = {
    id: versions[0]?.rule.id ?? firstId,
    version: Math.max(0, ...versions.map(({ rule }) => rule.version)) + 1,
  };
  return (
    <>
      <div className="grid gap-2">
        <PageHeading>{`Write version ${identity.version} of the rule`}</PageHeading>
        <p className="measure">
          {source === null ? '' : `It begins as version ${source.rule.version} stands. `}
          It is saved as a draft and holds for nobody until you put it in force.
        </p>
      </div>
      <RuleForm
        initial={initial}
        identity={identity}
        submitLabel="Save as a draft"
        isPending={create.isPending}
        error={create.error}
        onDirtyChange={setIsDirty}
        onSubmit={(rule) =>
          create.mutate(
            { rule, idempotencyKey: crypto.randomUUID() },
            {
              onSuccess: ({ id }) => {
                showToast('The draft is saved.');
                void navigate(paths.rule.href(id));
              },
            },
          )
        }
      />
      <UnsavedGuard isUnsaved={isDirty && !create.isPending && !create.isSuccess} />
    </>
  );
}
