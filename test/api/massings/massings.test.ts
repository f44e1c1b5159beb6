import { createHash } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import {
  massingComparisonSchema,
  massingDetailSchema,
  massingListSchema,
} from '../../../shared/contracts/massings.ts';
import { problemSchema } from '../../../shared/contracts/problem.ts';
import { buildSmallCity, cottage, massingFile, tower } from '../../support/small-city.ts';
import { bodyOf, startTestApi, type Agent, type TestApi } from '../../support/test-api.ts';

let api: TestApi;
let owner: Agent;

beforeAll(async () => {
  api = await startTestApi();
  await buildSmallCity(api.orm);
  owner = await api.signIn('owner');
});
afterAll(() => api.close());

function upload(agent: Agent, reference: string, bytes: Buffer, fileName = 'massing.geojson') {
  return agent.post(`/api/cases/${reference}/massings`).attach('file', bytes, fileName);
}

async function revisionsOf(reference: string): Promise<unknown[]> {
  const body = await bodyOf(owner.get(`/api/cases/${reference}/massings`).expect(200));
  return massingListSchema.parse(body).rows;
}

describe('uploading a massing', () => {
  it('answers with the check report, the blocks and the figures', async () => {
    const { reference } = await api.createCase('draft');
    const body = await bodyOf(upload(owner, reference, tower).expect(201));
    const massing = massingDetailSchema.parse(body);
    expect(massing).toMatchObject({ revision: 1, sound: true, uploadedByName: 'owner' });
    expect(massing.figures).toMatchObject({ proposedBlocks: 1, heightM: 30 });
    // A rectangle of 20 m × 20 m, its corners rounded to about a centimetre.
    expect(massing.figures.footprintM2).toBeCloseTo(400, 0);
    expect(massing.blocks.features.map(({ properties }) => properties.id)).toEqual(['tower']);
  });

  it('names the SHA-256 of the bytes and gives them back as they were sent', async () => {
    const { reference } = await api.createCase('draft');
    // White space and a byte order mark are part of the file.
    const bytes = Buffer.concat([Buffer.from('\uFEFF\n'), tower, Buffer.from('\r\n\t ')]);
    const body = await bodyOf(upload(owner, reference, bytes, 'Our tower (3).geojson').expect(201));
    const massing = massingDetailSchema.parse(body);
    expect(massing.sha256).toBe(createHash('sha256').update(bytes).digest('hex'));
    expect(massing.sizeBytes).toBe(bytes.length);

    const original = await owner
      .get(`/api/cases/${reference}/massings/1/original`)
      .responseType('blob')
      .expect(200);
    expect(Buffer.compare(original.body as Buffer, bytes)).toBe(0);
    expect(original.headers['content-disposition']).toBe(
      'attachment; filename="Our tower (3).geojson"',
    );
  });

  it('stores nothing of a file that cannot be read, and says why', async () => {
    const { reference } = await api.createCase('draft');
    const body = await bodyOf(
      upload(owner, reference, Buffer.from('no massing'), 'a.txt').expect(422),
    );
    const { code, errors } = problemSchema.parse(body);
    expect(code).toBe('MASSING_UNREADABLE');
    expect(errors).toHaveLength(1);
    expect(errors?.[0]?.message).toContain('a.txt');
    expect(await revisionsOf(reference)).toEqual([]);
  });

  it('stores a file that can be read but has errors, as not sound', async () => {
    const { reference } = await api.createCase('draft');
    const outside = massingFile([{ id: 'far', top: 9, at: [-35, 5, 10, 10] }]);
    const body = await bodyOf(upload(owner, reference, outside).expect(201));
    const massing = massingDetailSchema.parse(body);
    expect(massing.sound).toBe(false);
    expect(massing.issues.filter(({ severity }) => severity === 'error')).not.toEqual([]);
  });

  it('numbers revisions without gaps when two come at once', async () => {
    const { reference } = await api.createCase('draft');
    await Promise.all([
      upload(owner, reference, tower),
      upload(owner, reference, cottage),
      upload(owner, reference, tower),
    ]);
    expect(await revisionsOf(reference)).toMatchObject([
      { revision: 3 },
      { revision: 2 },
      { revision: 1 },
    ]);
  });

  it('makes one revision of a repeated upload with the same Idempotency-Key', async () => {
    const { reference } = await api.createCase('draft');
    const send = (bytes: Buffer) =>
      upload(owner, reference, bytes).set('Idempotency-Key', 'once-and-no-more');
    const first = await send(tower).expect(201);
    const second = await send(tower).expect(201);
    expect(second.body).toEqual(first.body);
    expect(await revisionsOf(reference)).toHaveLength(1);
    const other = await send(cottage).expect(409);
    expect(other.body).toMatchObject({ code: 'IDEMPOTENCY_KEY_REUSED' });
  });

  it('refuses a file above the limit', async () => {
    const { reference } = await api.createCase('draft');
    const body = await bodyOf(
      upload(owner, reference, Buffer.alloc(25 * 1024 * 1024 + 1)).expect(413),
    );
    expect(body).toMatchObject({ code: 'UPLOAD_TOO_LARGE' });
  });

  it('is for the owner alone, and only while the case can be edited', async () => {
    const submitted = await api.createCase('submitted');
    await upload(owner, submitted.reference, tower).expect(403);
    const draft = await api.createCase('draft');
    await upload(await api.signIn('other'), draft.reference, tower).expect(404);
    await upload(await api.signIn('planner'), draft.reference, tower).expect(403);
    await upload(await api.signIn('public'), draft.reference, tower).expect(401);
    const sentBack = await api.createCase('sent-back');
    await upload(owner, sentBack.reference, tower).expect(201);
  });
});

describe('a stored revision', () => {
  it('cannot be changed in the database', async () => {
    const { reference } = await api.createCase('draft');
    await upload(owner, reference, tower).expect(201);
    await expect(
      api.orm.em.fork().execute(`update massing_revision set sound = false`),
    ).rejects.toThrow('never changed');
  });

  it('is compared with another block by block', async () => {
    const { reference } = await api.createCase('draft');
    await upload(owner, reference, massingFile([{ id: 'a', top: 30, at: [10, 10, 20, 20] }]));
    await upload(
      owner,
      reference,
      massingFile([
        { id: 'a', top: 24, at: [10, 10, 20, 20] },
        { id: 'b', top: 5, at: [2, 2, 6, 6] },
      ]),
    );
    const body = await bodyOf(
      owner.get(`/api/cases/${reference}/massings/comparison?from=1&to=2`).expect(200),
    );
    const comparison = massingComparisonSchema.parse(body);
    expect(comparison.blocks).toMatchObject([
      { id: 'a', change: 'changed', before: { topM: 30 }, after: { topM: 24 } },
      { id: 'b', change: 'added', before: null },
    ]);
  });

  it('is not there under another number', async () => {
    const { reference } = await api.createCase('draft');
    await upload(owner, reference, tower).expect(201);
    await owner.get(`/api/cases/${reference}/massings/2`).expect(404);
    await owner.get(`/api/cases/${reference}/massings/first`).expect(404);
  });
});
