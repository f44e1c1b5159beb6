import type { RuleDraft } from '../rule-draft.ts';
import type { RuleProblems } from '../rule-problems.ts';

export interface ProblemListProps {
  problems: RuleProblems;
  clauses: RuleDraft['clauses'];
}

const partWords: Partial<Record<string, string>> = {
  id: 'short name',
  title: 'heading',
  receptors: 'who is judged',
  days: 'days',
  window: 'hours',
  minimumAltitude: 'lowest sun that counts',
  step: 'minutes between instants',
  measure: 'measure',
  limit: 'what is asked',
  baseline: 'compared with what',
  disregard: 'what is let pass',
  weight: 'weight',
};

/** Everything that is to be corrected, with the clause and the part of it in which it stands. */
export function ProblemList({ problems, clauses }: ProblemListProps) {
  const whereOf = (path: string) => {
    const [, index, part] = /^clauses\.(\d+)(?:\.(\w+))?/.exec(path) ?? [];
    if (index === undefined) return path.startsWith('bands') ? 'What a loss is called: ' : '';
    const title = clauses[Number(index)]?.title ?? '';
    const words = partWords[part ?? ''];
    return `Clause ${Number(index) + 1}${title === '' ? '' : ` (${title})`}${words === undefined ? '' : `, ${words}`}: `;
  };
  return (
    <div role="alert" className="border-s-3 border-madder py-1 ps-3.5">
      <p className="font-strong">
        <span className="text-madder" aria-hidden="true">
          ✕{' '}
        </span>
        {problems.size === 1
          ? 'One thing is to be corrected.'
          : `${problems.size} things are to be corrected.`}
      </p>
      <ul className="list-disc ps-5 text-small">
        {[...problems].map(([path, message]) => (
          <li key={path}>
            {whereOf(path)}
            {message}
          </li>
        ))}
      </ul>
    </div>
  );
}
