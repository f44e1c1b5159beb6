import { useState } from 'react';
import { Button } from '../../../components/button.tsx';
import { blankClause, clausesOfTemplate, copyOfClause, type ClauseDraft } from '../rule-draft.ts';
import type { RuleProblems } from '../rule-problems.ts';
import { ClauseCard } from './clause-card.tsx';
import { TemplateDialog } from './template-dialog.tsx';

export interface ClauseListProps {
  clauses: readonly ClauseDraft[];
  onChange: (clauses: ClauseDraft[]) => void;
  problems: RuleProblems;
}

/** The clauses of a rule in their order: opened one at a time, moved, doubled, taken out and put back. */
export function ClauseList({ clauses, onChange, problems }: ClauseListProps) {
  const [openKey, setOpenKey] = useState<string | null>(
    clauses.length === 1 ? (clauses[0]?.key ?? null) : null,
  );
  const [removed, setRemoved] = useState<{ clause: ClauseDraft; index: number } | null>(null);
  const [isPicking, setIsPicking] = useState(false);

  const insert = (index: number, added: ClauseDraft[]) => {
    onChange(clauses.toSpliced(index, 0, ...added));
    setOpenKey(added[0]?.key ?? null);
    setRemoved(null);
  };
  return (
    <div className="grid gap-5">
      {clauses.length > 0 ? null : (
        <p className="border-y border-hairline py-4">
          The rule has no clause yet. Add one from a template, or an empty one.
        </p>
      )}
      <ol className="grid gap-6">
        {clauses.map((clause, index) => (
          <ClauseCard
            key={clause.key}
            clause={clause}
            position={index + 1}
            clauseCount={clauses.length}
            isOpen={clause.key === openKey}
            problemCount={countProblems(problems, index)}
            problemAt={(path) => problems.get(`clauses.${index}${path === '' ? '' : '.'}${path}`)}
            onToggle={() => setOpenKey(clause.key === openKey ? null : clause.key)}
            onChange={(change) => onChange(clauses.with(index, { ...clause, ...change }))}
            onMove={(by) => onChange(clauses.toSpliced(index, 1).toSpliced(index + by, 0, clause))}
            onDuplicate={() => insert(index + 1, [copyOfClause(clause, clauses)])}
            onRemove={() => {
              onChange(clauses.toSpliced(index, 1));
              setRemoved({ clause, index });
            }}
          />
        ))}
      </ol>
      {removed === null ? null : (
        <p role="status" className="say flex flex-wrap gap-x-4">
          <span>
            Clause “{removed.clause.title === '' ? 'New clause' : removed.clause.title}” is taken
            out.
          </span>
          <Button kind="plain" autoFocus onPress={() => insert(removed.index, [removed.clause])}>
            Put it back
          </Button>
        </p>
      )}
      <div className="no-print flex flex-wrap gap-3">
        <Button onPress={() => setIsPicking(true)}>Add from a template</Button>
        <Button onPress={() => insert(clauses.length, [blankClause(clauses)])}>
          Add an empty clause
        </Button>
      </div>
      <TemplateDialog
        isOpen={isPicking}
        onClose={() => setIsPicking(false)}
        onPick={(template) => {
          insert(clauses.length, clausesOfTemplate(template, clauses));
          setIsPicking(false);
        }}
      />
    </div>
  );
}

function countProblems(problems: RuleProblems, index: number): number {
  const own = `clauses.${index}`;
  return [...problems.keys()].filter((path) => path === own || path.startsWith(`${own}.`)).length;
}
