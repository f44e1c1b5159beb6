import { execFile } from 'node:child_process';
import { createHash } from 'node:crypto';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { promisify } from 'node:util';
import canonicalize from 'canonicalize';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { z } from 'zod';
import type { StudyDetail } from '../../../shared/contracts/studies.ts';
import { buildSmallCity } from '../../support/small-city.ts';
import {
  createReviewedCase,
  hasEnded,
  requestStudy,
  startTestWorker,
  waitForStudy,
} from '../../support/study-worker.ts';
import { bodyOf, startTestApi, type Agent, type TestApi } from '../../support/test-api.ts';

const run = promisify(execFile);

let api: TestApi;
let planner: Agent;
let study: StudyDetail;
let address: string;
let text: string;

beforeAll(async () => {
  api = await startTestApi();
  await buildSmallCity(api.orm);
  planner = await api.signIn('planner');
  const { reference } = await createReviewedCase(api);
  const worker = await startTestWorker(api);
  const { id } = await requestStudy(planner, reference);
  study = await waitForStudy(planner, id, hasEnded);
  await worker.stop();
  address = `/api/studies/${study.id}/evidence`;
  ({ text } = await planner.get(address).expect(200));
});
afterAll(() => api.close());

const recordSchema = z.record(z.string(), z.unknown());
const readFile = () => recordSchema.parse(JSON.parse(text));

describe('the evidence file', () => {
  it('comes as JSON to be saved, for its reader alone, and is asked for again by its tag', async () => {
    const { headers } = await planner.get(address).set('Accept-Encoding', 'identity').expect(200);
    expect(headers['content-type']).toBe('application/json; charset=utf-8');
    expect(headers['content-disposition']).toMatch(/^attachment; filename=\S+-r1\.study\.json$/);
    expect(headers['cache-control']).toBe('private, no-cache');
    expect(Number(headers['content-length'])).toBe(Buffer.byteLength(text));
    const same = await planner.get(address).set('If-None-Match', String(headers['etag']));
    expect(same.status).toBe(304);
  });

  it('has in its digest all but the digest and the check of the engine', () => {
    const { digest, results, ...input } = readFile();
    const { check: _check, ...judged } = recordSchema.parse(results);
    // SHA-256 over canonical JSON (RFC 8785), made here without the code that made the file.
    const hashed = createHash('sha256').update(
      canonicalize({ ...input, results: judged }) ?? '',
      'utf8',
    );
    expect(digest).toBe(`sha256:${hashed.digest('hex')}`);
    expect(study.digest).toBe(digest);
  });

  it('is as the published schema says, which refuses what it does not know', async () => {
    const published = await bodyOf(planner.get('/api/schemas/study.json').expect(200));
    const schema = z.fromJSONSchema(recordSchema.parse(published));
    expect(() => schema.parse(readFile())).not.toThrow();
    expect(schema.safeParse({ ...readFile(), colour: 'red' }).success).toBe(false);
    const { blocks: _blocks, ...withoutBlocks } = readFile();
    expect(schema.safeParse(withoutBlocks).success).toBe(false);
  });

  it('names no person', () => {
    expect(text).not.toMatch(/testham\.example|applicant|Made by a test/);
  });
});

describe('the command, given the evidence file', () => {
  let folder: string;

  beforeAll(() => {
    folder = mkdtempSync(path.join(tmpdir(), 'noonmark-evidence-'));
  });
  afterAll(() => rmSync(folder, { recursive: true, force: true }));

  /** The exit code of `recompute FILE --verify`. */
  async function verify(content: string): Promise<number> {
    const file = path.join(folder, 'evidence.study.json');
    writeFileSync(file, content);
    const args = ['--import', 'tsx', 'api/cli/recompute.ts', file, '--verify'];
    try {
      await run(process.execPath, args);
      return 0;
    } catch (error) {
      return z.object({ code: z.number() }).parse(error).code;
    }
  }

  it('finds the same digest', async () => {
    expect(await verify(text)).toBe(0);
  });

  it('finds a figure that somebody has changed', async () => {
    const { results, ...file } = readFile();
    const findings = { ...recordSchema.parse(recordSchema.parse(results)['findings']), met: true };
    const changed = { ...file, results: { ...recordSchema.parse(results), findings } };
    expect(await verify(JSON.stringify(changed))).toBe(1);
  });

  it('finds what is no study', async () => {
    expect(await verify(text.slice(0, -1))).toBe(2);
    expect(await verify('{}')).toBe(2);
  });
});
