import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import {
  findingPageSchema,
  instantShadowsSchema,
  receptorDetailSchema,
  type StudyDetail,
} from '../../../shared/contracts/studies.ts';
import { computeStudy } from '../../../shared/study/compute-study.ts';
import { evidenceFileSchema, studyInputSchema } from '../../../shared/study/evidence-schema.ts';
import { buildSmallCity } from '../../support/small-city.ts';
import {
  createReviewedCase,
  hasEnded,
  requestStudy,
  startTestWorker,
  waitForStudy,
} from '../../support/study-worker.ts';
import { bodyOf, startTestApi, type Agent, type TestApi } from '../../support/test-api.ts';

let api: TestApi;
let worker: Awaited<ReturnType<typeof startTestWorker>>;
let planner: Agent;
let reference: string;
let study: StudyDetail;

beforeAll(async () => {
  api = await startTestApi();
  await buildSmallCity(api.orm);
  worker = await startTestWorker(api);
  planner = await api.signIn('planner');
  ({ reference } = await createReviewedCase(api));
  const { id } = await requestStudy(planner, reference);
  study = await waitForStudy(planner, id, hasEnded);
});
afterAll(async () => {
  await worker.stop();
  await api.close();
});

async function readEvidenceText(): Promise<string> {
  const { text } = await planner.get(`/api/studies/${study.id}/evidence`).expect(200);
  return text;
}

describe('a finished study', () => {
  it('has a digest, findings and the hours of the key dates', () => {
    expect(study).toMatchObject({ status: 'finished', failure: null, isCurrent: true });
    expect(study.digest).toMatch(/^sha256:[0-9a-f]{64}$/);
    expect(study.instantsDone).toBe(study.instantsTotal);
    expect(study.findings).toMatchObject({
      met: false,
      clauses: [{ clause: 'winter-noon-hours', receptorsNotMet: ['N-1'] }],
    });
    expect(study.instants).toContainEqual(
      expect.objectContaining({ at: '2026-12-21T12:00:00-06:00' }),
    );
  });

  it('gives the same digest when its evidence is computed again', async () => {
    const evidence = evidenceFileSchema.parse(JSON.parse(await readEvidenceText()));
    expect(evidence.digest).toBe(study.digest);
    const { results: _results, digest: _digest, ...input } = evidence;
    const again = await computeStudy(studyInputSchema.parse(input), { clipper: api.deps.clipper });
    expect(again.evidence.digest).toBe(study.digest);
  });

  it('hands out the evidence under the case and revision, the same text each time', async () => {
    const response = await planner.get(`/api/studies/${study.id}/evidence`).expect(200);
    expect(response.headers['content-disposition']).toBe(
      `attachment; filename=${reference}-r1.study.json`,
    );
    expect(await readEvidenceText()).toBe(response.text);
  });

  it('cannot be changed in the database', async () => {
    await expect(
      api.orm.em.fork().execute(`update study set digest = null where id = ?`, [study.id]),
    ).rejects.toThrow('never changed');
  });
});

describe('what a study is computed from', () => {
  it('takes the massing as proposed, the building on the site as existing, the others as context', async () => {
    const { blocks } = evidenceFileSchema.parse(JSON.parse(await readEvidenceText()));
    expect(blocks.features.map(({ properties: { id, role, top } }) => [id, role, top])).toEqual([
      ['building:B-E-1', 'context', 8],
      ['building:B-N-1', 'context', 8],
      ['building:B-N-2', 'context', 8],
      ['building:B-S-1', 'existing', 5],
      ['building:B-W-1', 'context', 8],
      ['tower', 'proposed', 30],
    ]);
  });

  it('takes parcels, yards, open space and collectors as receptors, but none of the site', async () => {
    const { receptors } = evidenceFileSchema.parse(JSON.parse(await readEvidenceText()));
    expect(receptors.features.map(({ properties }) => properties)).toEqual([
      { id: 'E-1', class: 'parcel', label: 'E-1 Test Row', plane: 0 },
      { id: 'N-1', class: 'parcel', label: 'N-1 Test Row', plane: 0 },
      { id: 'N-2', class: 'parcel', label: 'N-2 Test Row', plane: 0 },
      { id: 'P-1', class: 'parcel', label: 'P-1 Test Row', plane: 0 },
      { id: 'W-1', class: 'parcel', label: 'W-1 Test Row', plane: 0 },
      { id: 'Y-1', class: 'yard', label: 'Yard of N-1 Test Row', plane: 0 },
      { id: 'O-1', class: 'open-space', label: 'Test Park', plane: 0 },
      { id: 'C-1', class: 'collector', label: 'N-1 Test Row', plane: 8, tilt: 30, facing: 180 },
    ]);
  });
});

describe('the shadows of a study', () => {
  const shadowsAt = (at: string) => planner.get(`/api/studies/${study.id}/shadows`).query({ at });

  it('are as stored at a listed instant, in whichever offset it is written', async () => {
    const body = await bodyOf(shadowsAt('2026-12-21T18:00:00Z').expect(200));
    const shadows = instantShadowsSchema.parse(body);
    expect(shadows.at).toBe('2026-12-21T12:00:00-06:00');
    expect(shadows.features.map(({ properties }) => properties.kind)).toEqual([
      'before',
      'after',
      'netNew',
    ]);
    expect(shadows.features[2]?.geometry.coordinates).not.toEqual([]);
  });

  it('are computed at any other instant', async () => {
    const at = '2026-12-21T12:07:00-06:00';
    const body = await bodyOf(shadowsAt(at).expect(200));
    const shadows = instantShadowsSchema.parse(body);
    expect(shadows.at).toBe(at);
    // A few minutes after solar noon, by the sun's own motion of a quarter degree a minute.
    expect(shadows.azimuthDeg).toBeGreaterThan(180);
    expect(shadows.azimuthDeg).toBeLessThan(184);
    expect(shadows.features[2]?.geometry.coordinates).not.toEqual([]);
  });

  it('are refused with a sentence while the sun is down', async () => {
    const body = await bodyOf(shadowsAt('2026-12-21T23:00:00-06:00').expect(422));
    expect(body).toMatchObject({ code: 'INSTANT_INVALID' });
  });

  it('are refused for what is no instant', async () => {
    const body = await bodyOf(shadowsAt('noon').expect(422));
    expect(body).toMatchObject({ code: 'INPUT_INVALID', errors: [{ path: 'at' }] });
  });
});

describe('the findings table', () => {
  const list = async (query: Record<string, string>) => {
    const body = await bodyOf(planner.get(`/api/studies/${study.id}/receptors`).query(query));
    return findingPageSchema.parse(body);
  };

  it('has a row for each receptor that the clause judges, what is not met first', async () => {
    const { rows, total } = await list({});
    expect(total).toBe(6);
    expect(rows[0]?.receptor).toBe('N-1');
    expect(rows.slice(1).every(({ finding }) => finding !== 'not-met')).toBe(true);
  });

  it('says what the evidence says', async () => {
    const evidence = evidenceFileSchema.parse(JSON.parse(await readEvidenceText()));
    const result = evidence.results.receptors.find(({ id }) => id === 'N-1')?.clauses[0];
    const { rows } = await list({ q: 'n-1 test' });
    expect(rows).toHaveLength(1);
    expect(rows[0]).toMatchObject({
      receptor: 'N-1',
      finding: result?.finding,
      before: result?.tests[0]?.before,
      after: result?.tests[0]?.after,
      sentence: result?.note,
    });
  });

  it('is filtered, sorted and paged', async () => {
    const notMet = await list({ finding: 'not-met' });
    expect(notMet.rows.map(({ receptor }) => receptor)).toEqual(['N-1']);
    const first = await list({ sort: '-receptor', pageSize: '2' });
    expect(first.rows.map(({ receptor }) => receptor)).toEqual(['W-1', 'P-1']);
    const second = await list({ sort: 'receptor', page: '2', pageSize: '4' });
    expect(second).toMatchObject({ page: 2, pageSize: 4, total: 6 });
    expect(second.rows.map(({ receptor }) => receptor)).toEqual(['P-1', 'W-1']);
  });

  it('refuses a sort order that it does not have', async () => {
    await planner.get(`/api/studies/${study.id}/receptors?sort=colour`).expect(422);
  });

  it('comes as CSV with one line for each row', async () => {
    const { text, headers } = await planner
      .get(`/api/studies/${study.id}/receptors.csv`)
      .expect(200);
    expect(headers['content-type']).toContain('text/csv');
    const lines = text.split('\r\n');
    expect(lines[0]).toMatch(/^\uFEFF?receptor,label,class,clause,/);
    expect(lines).toHaveLength(1 + 6 + 1);
  });

  it('comes as GeoJSON with the outlines of the receptors', async () => {
    const body = await bodyOf(
      planner.get(`/api/studies/${study.id}/receptors.geojson?finding=not-met`).expect(200),
    );
    expect(body).toMatchObject({
      type: 'FeatureCollection',
      features: [{ properties: { receptor: 'N-1' }, geometry: { type: 'Polygon' } }],
    });
  });
});

describe('one receptor', () => {
  it('has its findings and its sun ledger on the four key dates', async () => {
    const body = await bodyOf(planner.get(`/api/studies/${study.id}/receptors/N-1`).expect(200));
    const { findings, ledger } = receptorDetailSchema.parse(body);
    expect(findings).toMatchObject([{ receptor: 'N-1', finding: 'not-met' }]);
    expect(ledger).toMatchObject({ receptor: 'N-1', label: 'N-1 Test Row' });
    expect(ledger.days.map(({ event }) => event)).toEqual([
      'march-equinox',
      'june-solstice',
      'september-equinox',
      'december-solstice',
    ]);
    expect(ledger.days[3]?.sunHours.lost).toBeGreaterThan(1);
  });

  it('has no findings where no clause judges it, but a ledger', async () => {
    const body = await bodyOf(planner.get(`/api/studies/${study.id}/receptors/Y-1`).expect(200));
    expect(receptorDetailSchema.parse(body)).toMatchObject({
      findings: [],
      ledger: { class: 'yard' },
    });
  });

  it('is not there when the study does not have it', async () => {
    await planner.get(`/api/studies/${study.id}/receptors/S-1`).expect(404);
  });
});
