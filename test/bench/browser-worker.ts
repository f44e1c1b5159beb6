import { readFileSync } from 'node:fs';
import { mkdtemp, rm } from 'node:fs/promises';
import { createServer, type Server } from 'node:http';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { pathToFileURL } from 'node:url';
import { chromium } from 'playwright-core';
import { build } from 'vite';
import { instantsOfSpan } from '../../shared/rules/rule-window.ts';
import { formatInstant } from '../../shared/solar/civil-time.ts';
import { sunAboveSpans } from '../../shared/solar/sun-above.ts';
import type { StudyInput } from '../../shared/study/evidence-schema.ts';
import type {} from './browser/page.ts';
import { median } from './measuring.ts';
import { makeTown } from './town.ts';

/** Of one kind of question: how often it was asked, and how long it took, in milliseconds. */
export interface WorkerTimes {
  count: number;
  /** In the worker: the engine alone. */
  scriptMedianMs: number;
  scriptWorstMs: number;
  /** From the question to the answer in the page: with the polygons handed over. */
  answerMedianMs: number;
  answerWorstMs: number;
}

export interface BrowserWorkerFigures {
  blocks: number;
  /** The shadows of one instant: every five minutes of the four key dates, but for a low sun. */
  instant: WorkerTimes;
  /** The same in the first and the last quarter of an hour of sun. */
  lowSun: WorkerTimes;
  /** One point's whole day in steps of 5 minutes. */
  day: WorkerTimes;
}

/** Length of the town's side that gives some 500 buildings around the proposal. */
const townSideM = 620;
const keyDates = ['2026-03-20', '2026-06-21', '2026-09-23', '2026-12-21'];
const lowSunMs = 15 * 60_000;
const chromiumPath = process.env['CHROMIUM_PATH'] ?? '/usr/bin/chromium';

/** Measures the engine where it runs for people: in the worker of a headless browser. */
export async function benchBrowserWorker(): Promise<BrowserWorkerFigures> {
  const input = withPoints(makeTown(townSideM));
  const folder = await mkdtemp(path.join(tmpdir(), 'noonmark-bench-'));
  await build({
    configFile: false,
    root: path.join(import.meta.dirname, 'browser'),
    logLevel: 'error',
    build: { outDir: folder, emptyOutDir: true, target: 'es2022', assetsInlineLimit: 0 },
    worker: { format: 'es' },
  });
  const server = serve(folder, JSON.stringify({ ...input, results: null, digest: null }));
  const port = await new Promise<number>((resolve) => {
    server.listen(0, '127.0.0.1', () => {
      const address = server.address();
      resolve(typeof address === 'object' && address !== null ? address.port : 0);
    });
  });
  const browser = await chromium.launch({
    executablePath: chromiumPath,
    args: ['--no-sandbox', '--disable-quic', '--no-first-run', '--disable-background-networking'],
  });
  try {
    const page = await browser.newPage();
    await page.goto(`http://127.0.0.1:${port}/`);
    await page.waitForFunction(() => 'bench' in window);
    await page.evaluate(() => window.bench.open('town'));
    const [worker] = page.workers();
    if (worker === undefined) throw new Error('The page has no worker.');
    const scriptMs = (kind: string) =>
      worker.evaluate((name) => {
        const taken = performance.getEntriesByName(name).map(({ duration }) => duration);
        performance.clearMeasures();
        return taken;
      }, kind);
    const draw = async (instants: string[]) => {
      const answerMs = await page.evaluate((all) => window.bench.drawAll(all), instants);
      return timesOf(await scriptMs('shadows'), answerMs);
    };
    const { usual, low } = listInstants(input);
    // Once before: what is measured is the compiled script, as after a second of dragging.
    await draw(usual.slice(0, 40));
    const instant = await draw(usual);
    const lowSun = await draw(low);
    const days: WorkerTimes[] = [];
    const ids = input.receptors.features
      .map(({ properties }) => properties.id)
      .filter((id) => id.startsWith('point-'));
    for (const date of keyDates) {
      const answerMs = await page.evaluate(
        ([receptors, day]) => window.bench.accountAll(receptors, day),
        [ids, date] as const,
      );
      days.push(timesOf(await scriptMs('day'), answerMs));
    }
    return { blocks: input.blocks.features.length, instant, lowSun, day: worstOf(days) };
  } finally {
    await browser.close();
    server.close();
    await rm(folder, { recursive: true, force: true });
  }
}

/** Points as squares of 10 cm, from 20 to 200 m north of the middle, where the proposal stands. */
function withPoints(input: StudyInput): StudyInput {
  const { longitude, latitude } = input.place;
  const halfM = 0.05;
  const metresPerDegree = 111_320;
  const points = Array.from({ length: 10 }, (_, index): StudyInput['receptors']['features'][0] => {
    const lat = latitude + (20 + index * 20) / metresPerDegree;
    const dLat = halfM / metresPerDegree;
    const dLng = dLat / Math.cos((latitude * Math.PI) / 180);
    const corners: [number, number][] = [
      [longitude - dLng, lat - dLat],
      [longitude + dLng, lat - dLat],
      [longitude + dLng, lat + dLat],
      [longitude - dLng, lat + dLat],
      [longitude - dLng, lat - dLat],
    ];
    return {
      type: 'Feature',
      properties: { id: `point-${index}`, class: 'yard', label: '', plane: 0 },
      geometry: { type: 'Polygon', coordinates: [corners] },
    };
  });
  const { receptors } = input;
  return { ...input, receptors: { ...receptors, features: [...receptors.features, ...points] } };
}

/** Every five minutes of the key dates, those of the first and last quarter of an hour apart. */
function listInstants({ place }: StudyInput): { usual: string[]; low: string[] } {
  const usual: string[] = [];
  const low: string[] = [];
  for (const date of keyDates) {
    const spans = sunAboveSpans(date, place.timezone, place.longitude, place.latitude, 0);
    for (const span of spans) {
      for (const atMs of instantsOfSpan(span, 5)) {
        const isLow = atMs - span.startMs < lowSunMs || span.endMs - atMs < lowSunMs;
        (isLow ? low : usual).push(formatInstant(atMs, place.timezone));
      }
    }
  }
  return { usual, low };
}

/** The built page, and the town's evidence at the address at which the worker looks for it. */
function serve(folder: string, evidence: string): Server {
  const types: Partial<Record<string, string>> = {
    '.html': 'text/html',
    '.js': 'text/javascript',
    '.wasm': 'application/wasm',
  };
  return createServer((request, response) => {
    const url = new URL(request.url ?? '/', 'http://localhost');
    if (url.pathname === '/api/studies/town/evidence') {
      response.setHeader('Content-Type', 'application/json').end(evidence);
      return;
    }
    const name = url.pathname === '/' ? 'index.html' : path.basename(url.pathname);
    const file = path.join(folder, name === 'index.html' ? '' : 'assets', name);
    try {
      const content = readFileSync(file);
      response.setHeader('Content-Type', types[path.extname(name)] ?? 'text/plain').end(content);
    } catch {
      response.writeHead(404).end();
    }
  });
}

function timesOf(scriptMs: readonly number[], answerMs: readonly number[]): WorkerTimes {
  if (scriptMs.length !== answerMs.length) throw new Error('Answers and measures do not agree.');
  return {
    count: scriptMs.length,
    scriptMedianMs: median(scriptMs),
    scriptWorstMs: Math.max(...scriptMs),
    answerMedianMs: median(answerMs),
    answerWorstMs: Math.max(...answerMs),
  };
}

/** The slowest of several days, with all of their questions counted. */
function worstOf(days: readonly WorkerTimes[]): WorkerTimes {
  const most = (figure: keyof WorkerTimes) => Math.max(...days.map((day) => day[figure]));
  return {
    count: days.reduce((sum, day) => sum + day.count, 0),
    scriptMedianMs: most('scriptMedianMs'),
    scriptWorstMs: most('scriptWorstMs'),
    answerMedianMs: most('answerMedianMs'),
    answerWorstMs: most('answerWorstMs'),
  };
}

/** The figures as rows of a table; the targets are 16 ms for an instant and 5 ms for a point's day. */
export function describeBrowserWorker({
  blocks,
  instant,
  lowSun,
  day,
}: BrowserWorkerFigures): string {
  const row = (what: string, times: WorkerTimes) =>
    `| ${what} (${times.count}) | ${times.scriptMedianMs.toFixed(1)} ms, ${times.scriptWorstMs.toFixed(1)} ms | ${times.answerMedianMs.toFixed(1)} ms, ${times.answerWorstMs.toFixed(1)} ms |`;
  return [
    `| in the browser’s worker, a tower among ${blocks} blocks | script: median, worst | answer in the page: median, worst |`,
    '| --- | --- | --- |',
    row('one instant drawn', instant),
    row('the same in the first and last quarter hour of sun', lowSun),
    row('one point’s whole day in steps of 5 min', day),
  ].join('\n');
}

if (process.argv[1] !== undefined && import.meta.url === pathToFileURL(process.argv[1]).href) {
  console.log(describeBrowserWorker(await benchBrowserWorker()));
}
