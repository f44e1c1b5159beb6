export type FindingMarkValue = 'met' | 'not-met' | 'disregarded' | 'not-affected' | 'no-receptor';

export interface FindingMarkProps {
  finding: FindingMarkValue;
  /** Within one step of the limit. */
  close?: boolean;
}

const words = {
  met: 'met',
  'not-met': 'not met',
  disregarded: 'too little to count',
  'not-affected': 'not affected',
  'no-receptor': 'nothing to judge',
} as const satisfies Record<FindingMarkValue, string>;

const signs = {
  met: '✓',
  'not-met': '✕',
  disregarded: '–',
  'not-affected': '–',
  'no-receptor': '–',
} as const satisfies Record<FindingMarkValue, string>;

/** The outcome under a rule: a sign and words, never colour alone. */
export function FindingMark({ finding, close = false }: FindingMarkProps) {
  return (
    <span className={finding === 'not-met' ? 'font-strong text-madder' : ''}>
      <span className="whitespace-nowrap">
        <span aria-hidden="true">
          {signs[finding]}
          {'\u00a0'}
        </span>
        {words[finding]}
      </span>
      {close ? <span className="font-normal text-ink-soft"> (close)</span> : null}
    </span>
  );
}
