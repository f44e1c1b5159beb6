import { useEffect, useState, type SubmitEvent } from 'react';
import { useController, useForm } from 'react-hook-form';
import type { Rule } from '../../../../shared/rules/rule-schema.ts';
import { Button } from '../../../components/button.tsx';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { TextField } from '../../../components/text-field.tsx';
import { isApiError } from '../../../lib/api-error.ts';
import { usePlace } from '../../../lib/place-context.ts';
import { placeOfMunicipality } from '../place-of-municipality.ts';
import { draftOfRule, ruleOfDraft, type RuleDraft } from '../rule-draft.ts';
import { problemsOfError, readRule, type RuleProblems } from '../rule-problems.ts';
import { BandsFields } from './bands-fields.tsx';
import { ClauseList } from './clause-list.tsx';
import { ProblemList } from './problem-list.tsx';
import { RuleJson } from './rule-json.tsx';

export interface RuleFormProps {
  initial: RuleDraft;
  /** The rule's id and the version's number, which are not written by hand. */
  identity: Pick<Rule, 'id' | 'version'>;
  submitLabel: string;
  isPending: boolean;
  /** Why the server did not take it. */
  error: unknown;
  onSubmit: (rule: Rule) => void;
  onDirtyChange: (isDirty: boolean) => void;
}

const noProblems: RuleProblems = new Map();

/** A rule built from clauses in plain words, read while one types exactly as the server will. */
export function RuleForm({
  initial,
  identity,
  submitLabel,
  isPending,
  error,
  onSubmit,
  onDirtyChange,
}: RuleFormProps) {
  const { municipality } = usePlace();
  const { control, reset, formState } = useForm<RuleDraft>({ defaultValues: initial });
  const title = useController({ control, name: 'title' }).field;
  const citation = useController({ control, name: 'citation' }).field;
  const clauses = useController({ control, name: 'clauses' }).field;
  const bands = useController({ control, name: 'bands' }).field;
  const [isSent, setIsSent] = useState(false);
  const { isDirty } = formState;
  useEffect(() => onDirtyChange(isDirty), [isDirty, onDirtyChange]);

  const values: RuleDraft = {
    title: title.value,
    citation: citation.value,
    clauses: clauses.value,
    bands: bands.value,
  };
  const place = placeOfMunicipality(municipality);
  const read = (value: object) =>
    readRule({ ...value, ...identity }, place, municipality.studyYear);
  const data = ruleOfDraft(values, identity);
  const reading = read(data);
  const refused = useRefusals(error, JSON.stringify(data));
  const problems: RuleProblems = new Map([...refused, ...reading.problems]);
  const problemAt = (path: string) => problems.get(path);

  const send = (event: SubmitEvent<HTMLFormElement>) => {
    event.preventDefault();
    setIsSent(true);
    if (reading.rule !== null && reading.problems.size === 0) onSubmit(reading.rule);
  };
  const isRefused = isApiError(error, 'INPUT_INVALID');
  return (
    <form noValidate className="grid gap-8" aria-label="The rule" onSubmit={send}>
      <div className="measure grid gap-4">
        <TextField
          label="Title of the rule"
          value={title.value}
          onChange={title.onChange}
          problem={problemAt('title')}
          maxLength={200}
        />
        <TextField
          label="Where it stands in the code"
          optional
          description="Printed with every finding."
          value={citation.value}
          onChange={citation.onChange}
          problem={problemAt('citation')}
          maxLength={300}
        />
      </div>
      <section className="grid gap-4" aria-labelledby="clauses-heading">
        <h2 id="clauses-heading">Clauses</h2>
        {problems.has('clauses') && clauses.value.length > 0 ? (
          <p className="font-strong text-madder">✕ {problems.get('clauses')}</p>
        ) : null}
        <ClauseList clauses={clauses.value} onChange={clauses.onChange} problems={problems} />
      </section>
      <div className="measure">
        <BandsFields bands={bands.value} onChange={bands.onChange} problemAt={problemAt} />
      </div>
      <RuleJson
        value={data}
        read={read}
        onTake={(rule) => reset(draftOfRule(rule), { keepDefaultValues: true })}
      />
      <div className="grid justify-items-start gap-3 border-t border-ink pt-5">
        {problems.size > 0 && (isSent || refused.size > 0) ? (
          <ProblemList problems={problems} clauses={values.clauses} />
        ) : null}
        {error !== null && error !== undefined && !isRefused ? (
          <ProblemNotice error={error} />
        ) : null}
        <Button type="submit" kind="primary" isPending={isPending}>
          {submitLabel}
        </Button>
      </div>
    </form>
  );
}

/** What the server refused, until anything is written anew. */
function useRefusals(error: unknown, written: string): RuleProblems {
  const [seen, setSeen] = useState<{ error: unknown; written: string }>({ error: null, written });
  if (error !== seen.error) setSeen({ error, written });
  const isStanding = error === seen.error && written === seen.written;
  return isApiError(error, 'INPUT_INVALID') && isStanding ? problemsOfError(error) : noProblems;
}
