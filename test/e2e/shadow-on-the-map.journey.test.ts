import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { loadClipper } from '../../api/clipper.ts';
import type { Clipper } from '../../shared/shadow/clipper.ts';
import { evidenceFileSchema, type StudyInput } from '../../shared/study/evidence-schema.ts';
import { castShadowsAt } from '../../shared/study/shadows-at.ts';
import { launchBrowser, visit, type Visitor } from './browser.ts';
import { signIn } from './drivers/session.ts';
import { pictureAtRest, pixelsAlong, pixelsIn, widen, type MapView } from './drivers/study-map.ts';

let browser: Browser;
let clipper: Clipper;
let planner: Visitor;
let input: StudyInput;

beforeAll(async () => {
  browser = await launchBrowser();
  clipper = await loadClipper();
  planner = await visit(browser, { width: 1440, height: 900 });
  await signIn(planner.page, 'planner');
  // What the core says is computed here, from the study's own evidence file.
  const [evidence] = await Promise.all([
    planner.page.waitForResponse((response) => response.url().endsWith('/evidence')),
    planner.page.goto('/desk/2026-0001/study'),
  ]);
  const {
    results: _results,
    digest: _digest,
    ...rest
  } = evidenceFileSchema.parse(JSON.parse(await evidence.text()));
  input = rest;
});

afterAll(() => browser.close());

/** Close enough for the hatch, too far for house numbers. */
const view: MapView = { zoom: 16.6, latitude: 46.7496, longitude: -91.2975 };
/** The hatch repeats every 6 px, so that a square of this side always holds some of its lines. */
const squarePx = 8;
/** Half of the outline of 1 px lies outside its polygon; it is anti-aliased, and mitred at sharp corners. */
const edgePx = 3;

interface Counted {
  /** Madder pixels of the hatch outside the core's net new shadow and its edge. */
  strayPixels: number;
  /** Squares wholly inside it with nothing drawn over them, and those without any hatch. */
  squares: number;
  bareSquares: number;
}

async function countHatch(at: string, address: string): Promise<Counted> {
  const { page } = planner;
  const show = async (layer: string) => {
    const camera = `${view.zoom}/${view.latitude}/${view.longitude}`;
    await page.goto(`/desk/2026-0001/study?${address}&layer=${layer}&view=${camera}`);
    await page.getByText(/the proposal shades .* of ground anew/).waitFor();
    return pictureAtRest(page);
  };
  // The outlines and crosses of who does not meet the rule are madder too, and in both pictures.
  const before = await show('before');
  const after = await show('after');
  const { width } = after;
  const core = castShadowsAt(input, at, clipper);
  if (core === null) throw new Error(`The sun is down at ${at}.`);
  const netNew = pixelsIn(core.netNew.coordinates, view, after);
  const covered = pixelsIn(
    input.blocks.features.flatMap(({ geometry }) =>
      geometry.type === 'Polygon' ? [geometry.coordinates] : geometry.coordinates,
    ),
    view,
    after,
  );
  const edges = pixelsAlong(core.netNew.coordinates, view, after);
  const nearNetNew = widen(
    netNew.map((isIn, pixel) => isIn | (edges[pixel] ?? 0)),
    width,
    edgePx,
  );
  const nearBlocks = widen(covered, width, edgePx);
  const nearMarks = widen(before.isMadder, width, edgePx);
  const counted: Counted = { strayPixels: 0, squares: 0, bareSquares: 0 };
  after.isMadder.forEach((isMadder, index) => {
    if (isMadder === 1 && nearMarks[index] === 0 && nearNetNew[index] === 0) {
      counted.strayPixels += 1;
    }
  });
  for (let row = 0; row + squarePx <= after.height; row += squarePx) {
    for (let column = 0; column + squarePx <= width; column += squarePx) {
      const square = Array.from(
        { length: squarePx ** 2 },
        (_, index) => (row + Math.floor(index / squarePx)) * width + column + (index % squarePx),
      );
      const isClear = square.every(
        (pixel) => netNew[pixel] === 1 && nearBlocks[pixel] === 0 && nearMarks[pixel] === 0,
      );
      if (!isClear) continue;
      counted.squares += 1;
      if (!square.some((pixel) => after.isMadder[pixel] === 1)) counted.bareSquares += 1;
    }
  }
  return counted;
}

describe('the hatch on the map of a study', () => {
  it.each([
    ['2026-12-21T12:00:00-06:00', 'date=2026-12-21&time=12:00'],
    // An hour and a day that no rule judges and no study lists: the engine beside the page draws it.
    ['2026-10-05T16:10:00-05:00', 'date=2026-10-05&time=16:10'],
    ['2026-06-21T08:35:00-05:00', 'date=2026-06-21&time=08:35'],
  ])('lies where the core says net new at %s, and nowhere else', async (at, address) => {
    const { strayPixels, squares, bareSquares } = await countHatch(at, address);
    expect(strayPixels).toBe(0);
    expect(squares).toBeGreaterThan(5);
    // A street's name may lie over a square or two.
    expect(bareSquares).toBeLessThanOrEqual(Math.ceil(squares / 20));
  });
});
