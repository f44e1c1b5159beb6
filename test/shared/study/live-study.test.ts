import { beforeAll, describe, expect, it } from 'vitest';
import { loadClipper } from '../../../api/clipper.ts';
import type { Clipper } from '../../../shared/shadow/clipper.ts';
import type { StudyInput } from '../../../shared/study/evidence-schema.ts';
import { openLiveStudy } from '../../../shared/study/live-study.ts';
import { readStudyInput } from '../../../shared/study/read-study-input.ts';
import { computeReceptorLedger } from '../../../shared/study/receptor-ledger.ts';
import { castShadowsAt } from '../../../shared/study/shadows-at.ts';
import { makeRectangle } from '../../support/plane-scenes.ts';
import { blockFeature, receptorFeature, studyInputOf } from '../../support/small-study.ts';

let clipper: Clipper;
beforeAll(async () => {
  clipper = await loadClipper();
});

/** A tower south of one yard, a shed beside another, and a yard far to the south of both. */
function towerInput(): StudyInput {
  const result = readStudyInput(
    studyInputOf({
      blocks: [
        blockFeature('tower', 'proposed', makeRectangle(-10, -30, 20, 20), 0, 40),
        blockFeature('shed', 'context', makeRectangle(60, -5, 10, 5), 0, 4),
      ],
      receptors: [
        receptorFeature('north', makeRectangle(-10, 0, 20, 20)),
        receptorFeature('beside-shed', makeRectangle(60, 0, 20, 20)),
        receptorFeature('south', makeRectangle(-10, -200, 20, 20)),
      ],
    }),
  );
  if (!result.ok) throw new Error(JSON.stringify(result.issues));
  return result.input;
}

// The sources of every figure are the study's own functions, which have tests of their own: a look
// at one instant or day must say what the study says.
describe('a study that is looked at', () => {
  it('draws at any instant what the server draws, and measures what is shaded anew', () => {
    const input = towerInput();
    const at = '2026-05-03T10:20:00Z';
    const { netNewM2, removedM2, ...shadows } = openLiveStudy(input, clipper).shadowsAt(at) ?? {};
    expect(shadows).toEqual(castShadowsAt(input, at, clipper));
    expect(netNewM2).toBeGreaterThan(400);
    expect(removedM2).toBe(0);
  });

  it('draws nothing with the sun down', () => {
    expect(openLiveStudy(towerInput(), clipper).shadowsAt('2026-12-21T23:00:00Z')).toBeNull();
  });

  it('gives the ledger’s account of a key date', () => {
    const input = towerInput();
    const ledgerDay = computeReceptorLedger(input, 'north').days.find(
      ({ event }) => event === 'december-solstice',
    );
    const day = openLiveStudy(input, clipper).dayOf('north', ledgerDay?.date ?? '');
    expect(day).toEqual(ledgerDay);
  });

  it('gives an account of a day that is no key date, and of no receptor that it does not know', () => {
    const live = openLiveStudy(towerInput(), clipper);
    const day = live.dayOf('north', '2026-11-09');
    expect(day).toMatchObject({ event: null, date: '2026-11-09' });
    expect(day?.sunHours.lost).toBeGreaterThan(1);
    expect(live.dayOf('elsewhere', '2026-11-09')).toBeNull();
  });

  it.each(['2026-11-09', '2026-12-21', '2026-06-21'])(
    'lists on %s exactly the receptors whose account has a loss',
    (date) => {
      const input = towerInput();
      const live = openLiveStudy(input, clipper);
      const ids = input.receptors.features.map(({ properties }) => properties.id);
      const losing = ids.filter((id) => (live.dayOf(id, date)?.sunHours.lost ?? 0) > 0);
      expect(live.losersOn(date).map(({ id }) => id)).toEqual(losing);
      expect(losing).toContain('north');
      expect(losing).not.toContain('south');
    },
  );
});
