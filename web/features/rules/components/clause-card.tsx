import { useId } from 'react';
import { sayClause } from '../../../../shared/rules/clause-sentence.ts';
import { Button } from '../../../components/button.tsx';
import { useFormats } from '../../../lib/place-context.ts';
import { clauseFigures } from '../clause-in-words.ts';
import { unfinishedClause, type ClauseDraft } from '../rule-draft.ts';
import type { ProblemAt } from '../rule-problems.ts';
import { ClauseFields } from './clause/clause-fields.tsx';
import { CountedInstants } from './counted-instants.tsx';

export interface ClauseCardProps {
  clause: ClauseDraft;
  /** From 1. */
  position: number;
  clauseCount: number;
  isOpen: boolean;
  problemCount: number;
  onToggle: () => void;
  onChange: (change: Partial<ClauseDraft>) => void;
  onMove: (by: -1 | 1) => void;
  onDuplicate: () => void;
  onRemove: () => void;
  problemAt: ProblemAt;
}

/** One clause in the form: its sentence, always, and its fields and its calendar when it is open. */
export function ClauseCard(props: ClauseCardProps) {
  const { clause, position, clauseCount, isOpen, problemCount, onChange, problemAt } = props;
  const formats = useFormats();
  const id = useId();
  const unfinished = unfinishedClause(clause);
  const name = `clause ${position}`;
  const sentence = sayClause(unfinished, clauseFigures(formats));
  const live = isOpen ? 'polite' : 'off';
  return (
    <li className="grid gap-3 border-t border-ink pt-4" aria-labelledby={id}>
      <div className="flex flex-wrap items-baseline gap-x-5 gap-y-1">
        <h3 id={id} className="grow text-lead">
          {position}. {clause.title.trim() === '' ? 'New clause' : clause.title}
        </h3>
        <div className="no-print flex flex-wrap gap-x-4 gap-y-1">
          <Button
            kind="plain"
            aria-expanded={isOpen}
            aria-label={isOpen ? `Close ${name}` : `Edit ${name}`}
            onPress={props.onToggle}
          >
            {isOpen ? 'Close' : 'Edit'}
          </Button>
          <Button
            kind="plain"
            aria-label={`Move ${name} up`}
            isDisabled={position === 1}
            onPress={() => props.onMove(-1)}
          >
            Up
          </Button>
          <Button
            kind="plain"
            aria-label={`Move ${name} down`}
            isDisabled={position === clauseCount}
            onPress={() => props.onMove(1)}
          >
            Down
          </Button>
          <Button kind="plain" aria-label={`Duplicate ${name}`} onPress={props.onDuplicate}>
            Duplicate
          </Button>
          <Button kind="plain" aria-label={`Remove ${name}`} onPress={props.onRemove}>
            Remove
          </Button>
        </div>
      </div>
      <p className={`say measure ${isOpen ? 'lg:hidden' : ''}`} aria-live={live}>
        {sentence}
      </p>
      {clause.source === null ? null : (
        <p className="measure text-small">
          From: {clause.source.citation}
          {clause.source.remark === '' ? '' : `. ${clause.source.remark}`}
        </p>
      )}
      {isOpen || problemCount === 0 ? null : (
        <p className="text-small font-strong text-madder">
          ✕{' '}
          {problemCount === 1
            ? 'One field is to be corrected.'
            : `${problemCount} fields are to be corrected.`}
        </p>
      )}
      {isOpen ? (
        <div className="grid gap-x-10 gap-y-6 lg:grid-cols-[minmax(0,6fr)_minmax(0,5fr)] [&>*]:min-w-0">
          <ClauseFields clause={clause} onChange={onChange} problemAt={problemAt} />
          <div className="grid gap-5 lg:sticky lg:top-4 lg:self-start">
            {/* Beside the fields it stays in sight; on a narrow screen it stands above them. */}
            <p className="say hidden lg:block" aria-live={live}>
              {sentence}
            </p>
            <CountedInstants
              days={clause.days}
              window={unfinished.window}
              minimumAltitude={clause.minimumAltitude}
              step={clause.step}
            />
          </div>
        </div>
      ) : null}
    </li>
  );
}
