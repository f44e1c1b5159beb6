import { describe, expect, it } from 'vitest';
import {
  abilitiesOnCase,
  abilitiesOnRule,
  mayOnCase,
  mayReadRuleDrafts,
  mayTransition,
  statesSeenBy,
  transitionsOnCase,
  type Actor,
  type CaseAction,
} from '../../api/policy.ts';
import { caseStates, caseTransitions } from '../../shared/contracts/case-life.ts';
import { caseAbilities } from '../../shared/contracts/cases.ts';
import { caseSteps, readRows } from '../support/case-life-table.ts';

const applicantId = '00000000-0000-4000-8000-000000000001';
const strangerId = '00000000-0000-4000-8000-000000000002';

/** Everybody who can ask; staff that once applied with the same account gain nothing by it. */
const people: Record<string, { who: string; actor: Actor | null }> = {
  public: { who: 'u', actor: null },
  'another applicant': { who: 'x', actor: { id: strangerId, role: 'applicant' } },
  'the applicant': { who: 'o', actor: { id: applicantId, role: 'applicant' } },
  'a planner': { who: 'p', actor: { id: strangerId, role: 'planner' } },
  'a planner who applied': { who: 'p', actor: { id: applicantId, role: 'planner' } },
  'a member of the board': { who: 'b', actor: { id: strangerId, role: 'board' } },
  'a member of the board who applied': { who: 'b', actor: { id: applicantId, role: 'board' } },
  'an administrator': { who: 'a', actor: { id: strangerId, role: 'administrator' } },
  'an administrator who applied': { who: 'a', actor: { id: applicantId, role: 'administrator' } },
};

/**
 * Who may do what in which state, written out by hand. u: the public, x: another applicant, o: the
 * applicant of the case (owner), p: a planner, b: the board, a: an administrator, -: nobody.
 * `*` stands for everybody, `opa` for those who work on the case.
 */
const table = `
                    draft submitted sent-back complete under-review open-for-comment report-issued continued heard approved approved-with-conditions refused appealed remanded withdrawn
see                 o     opa       opa       opa      opa          *                *             *         *     *        *                        *       *        *        opa
edit                o     -         o         -        -            -                -             -         -     -        -                        -       -        -        -
upload-massing      o     -         o         -        -            -                -             -         -     -        -                        -       -        -        -
request-study       -     p         -         p        p            p                p             p         -     -        -                        -       -        p        -
read-study          -     opa       opa       opa      opa          *                *             *         *     *        *                        *       *        *        opa
read-every-comment  -     pa        pa        pa       pa           pa               pa            pa        pa    pa       pa                       pa      pa       pa       pa
moderate-comments   -     -         -         -        -            p                p             p         p     p        p                        p       p        p        -
write-comment       -     -         -         -        -            *                -             *         -     -        -                        -       -        -        -
issue-report        -     -         -         -        -            p                p             p         -     -        -                        -       -        -        -
read-report         -     opa       opa       opa      opa          *                *             *         *     *        *                        *       *        *        opa
`;

const actions: readonly CaseAction[] = ['see', ...caseAbilities];
const states = table.trim().split('\n')[0]?.trim().split(/\s+/) ?? [];
const rows = readRows(table);

function isGranted(action: string, state: string, who: string): boolean {
  const cell = rows.find(({ name }) => name === action)?.cells[states.indexOf(state)];
  if (cell === undefined) throw new Error(`${action} in ${state} stands not in the table.`);
  return cell === '*' || cell.includes(who);
}

describe('the policy of a case', () => {
  it('has a row in the table for every action and a column for every state', () => {
    expect(rows.map(({ name }) => name).sort()).toEqual([...actions].sort());
    expect([...states].sort()).toEqual([...caseStates].sort());
  });

  describe.each(Object.entries(people))('for %s', (_name, { who, actor }) => {
    it.each(actions)('grants as the table says: %s', (action) => {
      const granted = caseStates.filter((state) =>
        mayOnCase(actor, action, { state, applicantId }),
      );
      expect(granted).toEqual(caseStates.filter((state) => isGranted(action, state, who)));
    });

    it.each(caseStates)('names as abilities all that may be done in the state %s', (state) => {
      expect(abilitiesOnCase(actor, { state, applicantId })).toEqual(
        caseAbilities.filter((ability) => isGranted(ability, state, who)),
      );
    });
  });

  it('lets nobody do anything with a case that they may not see', () => {
    for (const { actor } of Object.values(people)) {
      for (const state of caseStates) {
        const facts = { state, applicantId };
        if (!mayOnCase(actor, 'see', facts)) expect(abilitiesOnCase(actor, facts)).toEqual([]);
      }
    }
  });

  it.each([
    [null, 'u'],
    ['applicant', 'x'],
    ['planner', 'p'],
    ['board', 'b'],
    ['administrator', 'a'],
  ] as const)('lists for %s the states in which others’ cases are seen', (role, who) => {
    expect([...statesSeenBy(role)].sort()).toEqual(
      caseStates.filter((state) => isGranted('see', state, who)).sort(),
    );
  });
});

describe('the steps of a case', () => {
  const lawful = (who: string, from: string): string[] =>
    caseSteps
      .filter((step) => step.from === from)
      .filter(
        ({ by }) =>
          (who === 'o' && by.includes('applicant')) || (who === 'p' && by.includes('planner')),
      )
      .map(({ to }) => to);

  describe.each(Object.entries(people))('for %s', (_name, { who, actor }) => {
    it.each(caseStates)('are those of the table from the state %s', (state) => {
      const steps = transitionsOnCase(actor, { state, applicantId }).map(({ to }) => to);
      expect(steps.sort()).toEqual(lawful(who, state).sort());
    });
  });

  it('are not made from a state other than that of the case', () => {
    const planner: Actor = { id: strangerId, role: 'planner' };
    for (const transition of caseTransitions.filter(({ by }) => by.includes('planner'))) {
      const possible = caseStates.filter((state) =>
        mayTransition(planner, transition, { state, applicantId }),
      );
      expect(possible.sort()).toEqual([...transition.from].sort());
    }
  });
});

describe('a version of the rule that is not in force', () => {
  it.each([
    [null, false],
    ['applicant', false],
    ['board', false],
    ['planner', true],
    ['administrator', true],
  ] as const)('is open to %s: %s', (role, isOpen) => {
    expect(mayReadRuleDrafts(role === null ? null : { id: strangerId, role })).toBe(isOpen);
  });
});

describe('the policy of the rule', () => {
  const kept = ['in-force', 'retired'] as const;
  const toCome = ['draft', 'scheduled'] as const;
  const actorOf = (role: 'administrator' | 'planner' | 'board' | 'applicant') => ({
    id: strangerId,
    role,
  });

  it('lets an administrator work on what has not come into force, and copy what has', () => {
    const administrator = actorOf('administrator');
    for (const state of toCome) {
      expect(abilitiesOnRule(administrator, state)).toEqual(['copy', 'change', 'enact', 'try']);
    }
    for (const state of kept) {
      expect(abilitiesOnRule(administrator, state)).toEqual(['copy', 'try']);
    }
  });

  it('lets a planner try it, and everybody else read', () => {
    for (const state of [...toCome, ...kept]) {
      expect(abilitiesOnRule(actorOf('planner'), state)).toEqual(['try']);
      for (const actor of [actorOf('board'), actorOf('applicant'), null]) {
        expect(abilitiesOnRule(actor, state)).toEqual([]);
      }
    }
  });
});
