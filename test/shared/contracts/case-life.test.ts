import { describe, expect, it } from 'vitest';
import {
  caseStates,
  caseStateWords,
  caseTransitions,
  commentableCaseStates,
  editableCaseStates,
  findTransition,
  publicCaseStates,
  type CaseState,
} from '../../../shared/contracts/case-life.ts';
import { caseSteps } from '../../support/case-life-table.ts';

describe('the life of a case', () => {
  it('has a row and a column in the table for every state', () => {
    expect(caseSteps).toHaveLength(caseStates.length ** 2);
    expect(new Set(caseSteps.map(({ from }) => from))).toEqual(new Set(caseStates));
  });

  it.each(caseSteps.filter(({ by }) => by.length > 0))(
    'lets $by take a case from $from to $to',
    ({ from, to, by }) => {
      expect([...(findTransition(from, to)?.by ?? [])].sort()).toEqual([...by].sort());
    },
  );

  it.each(caseStates)('knows no other step from %s', (from) => {
    const closed = caseSteps.filter((step) => step.from === from && step.by.length === 0);
    expect(closed.filter(({ to }) => findTransition(from, to) !== null)).toEqual([]);
  });

  it('names each step once, so that its guards are not a matter of order', () => {
    const steps = caseTransitions.flatMap(({ from, to }) => from.map((one) => `${one} → ${to}`));
    expect(steps).toHaveLength(new Set(steps).size);
  });

  it('reaches every state from the draft', () => {
    const reached = new Set<CaseState>(['draft']);
    for (const from of reached) {
      for (const to of caseStates) if (findTransition(from, to) !== null) reached.add(to);
    }
    expect(reached).toEqual(new Set(caseStates));
  });

  it('ends where a case is withdrawn, and nowhere else', () => {
    const ends = caseStates.filter((from) =>
      caseStates.every((to) => findTransition(from, to) === null),
    );
    expect(ends).toEqual(['withdrawn']);
  });
});

describe('what a step asks', () => {
  const guards: Partial<Record<CaseState, string[]>> = {
    submitted: ['sound-massing'],
    'open-for-comment': ['finished-study'],
    'report-issued': ['finished-study', 'issued-report'],
  };

  it.each(caseTransitions)('checks what must hold before $to', (transition) => {
    expect([...transition.guards].sort()).toEqual(guards[transition.to] ?? []);
  });

  it('is a reason wherever something is turned down, put off, decided or ended', () => {
    const reasoned = caseTransitions.filter(({ needsReason }) => needsReason).map(({ to }) => to);
    expect(new Set(reasoned)).toEqual(
      new Set([
        'sent-back',
        'continued',
        'approved',
        'approved-with-conditions',
        'refused',
        'appealed',
        'remanded',
        'withdrawn',
      ]),
    );
    const free = caseTransitions.filter(({ needsReason }) => !needsReason).map(({ to }) => to);
    expect(free.filter((to) => reasoned.includes(to))).toEqual([]);
  });
});

describe('what a state opens', () => {
  it('is the case to everybody from its publication on, but not once it is withdrawn', () => {
    expect(new Set(publicCaseStates)).toEqual(
      new Set([
        'open-for-comment',
        'report-issued',
        'continued',
        'heard',
        'approved',
        'approved-with-conditions',
        'refused',
        'appealed',
        'remanded',
      ]),
    );
  });

  it('is the application to its applicant while it is a draft or sent back', () => {
    expect(new Set(editableCaseStates)).toEqual(new Set(['draft', 'sent-back']));
  });

  it('is the comment box only while the case is public', () => {
    expect(new Set(commentableCaseStates)).toEqual(new Set(['open-for-comment', 'continued']));
    expect(commentableCaseStates.filter((state) => !publicCaseStates.includes(state))).toEqual([]);
  });

  it('has words of its own for people', () => {
    expect(new Set(Object.values(caseStateWords)).size).toBe(caseStates.length);
  });
});
