import type { CaseTransition, TransitionGuard } from '../../../shared/contracts/case-life.ts';
import type { ErrorCode } from '../../../shared/contracts/problem.ts';
import type { CaseStanding } from './case-standing.ts';

/** What stands in the way of a transition, as a sentence that says what to do first. */
export interface Obstacle {
  code: ErrorCode;
  title: string;
}

const guards: Record<TransitionGuard, (standing: CaseStanding) => Obstacle | null> = {
  'sound-massing': ({ latestMassing, isSiteNewer }) => {
    if (latestMassing === null) {
      return { code: 'MASSING_MISSING', title: 'Upload a massing first.' };
    }
    if (isSiteNewer) {
      return {
        code: 'MASSING_UNSOUND',
        title: 'The site has changed since the massing was uploaded. Upload the massing again.',
      };
    }
    return latestMassing.sound
      ? null
      : {
          code: 'MASSING_UNSOUND',
          title: 'The massing has errors. Correct them and upload it again.',
        };
  },
  'finished-study': ({ hasFinishedStudy }) =>
    hasFinishedStudy
      ? null
      : { code: 'STUDY_MISSING', title: 'Run a study of the current massing first.' },
  'issued-report': ({ hasReport }) =>
    hasReport
      ? null
      : {
          code: 'CASE_TRANSITION_REFUSED',
          title: 'Issue a report on the current massing first.',
        },
};

/** The first thing that stands in the way, or null. */
export function findObstacle(transition: CaseTransition, standing: CaseStanding): Obstacle | null {
  for (const guard of transition.guards) {
    const obstacle = guards[guard](standing);
    if (obstacle !== null) return obstacle;
  }
  return null;
}
