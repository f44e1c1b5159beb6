import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { orientRing, type Ring } from '../../../shared/geometry/ring.ts';
import { createLightMeasures, makeLitArea } from '../../../shared/shadow/receptor-light.ts';
import { castShadowLayer, type SceneBlock } from '../../../shared/shadow/shadow-layer.ts';
import { makeBlock, makeRandomTown, makeRectangle } from '../../support/plane-scenes.ts';
import { createSeededRandom } from '../../support/seeded-random.ts';

const measures = createLightMeasures();

const sunArbitrary = fc.record({
  azimuthDeg: fc.oneof(
    fc.constantFrom(0, 45, 90, 135, 180, 270),
    fc.double({ min: 0, max: 359, noNaN: true }),
  ),
  altitudeDeg: fc.double({ min: 0.5, max: 89, noNaN: true }),
});
const seedArbitrary = fc.integer({ min: 1, max: 1_000_000 });
const options = { numRuns: 60, seed: 7 };

function lightOf(
  blocks: SceneBlock[],
  ring: Ring,
  sun: { azimuthDeg: number; altitudeDeg: number },
) {
  const area = makeLitArea([orientRing(ring, 'outer')], []);
  return measures.light(area, castShadowLayer(blocks, sun, 0));
}

const receptor = makeRectangle(-41, -33, 70, 52);
const receptorM2 = 70 * 52;

function turn(ring: Ring, deg: number): Ring {
  const angle = (-deg * Math.PI) / 180;
  return ring.map(([x, y]) => [
    x * Math.cos(angle) - y * Math.sin(angle),
    x * Math.sin(angle) + y * Math.cos(angle),
  ]);
}

function move(ring: Ring, dx: number, dy: number): Ring {
  return ring.map(([x, y]) => [x + dx, y + dy]);
}

const mapRings = (blocks: SceneBlock[], change: (ring: Ring) => Ring) =>
  blocks.map((block) => makeBlock(block.rings.map(change), block.baseM, block.topM, block.role));

describe('the light on an area', () => {
  it('never goes below nothing or above the area, and its changes balance', () => {
    fc.assert(
      fc.property(seedArbitrary, sunArbitrary, (seed, sun) => {
        const blocks = makeRandomTown(createSeededRandom(seed), 25);
        const light = lightOf(blocks, receptor, sun);
        for (const value of Object.values(light)) {
          expect(value).toBeGreaterThanOrEqual(-1e-9);
          expect(value).toBeLessThanOrEqual(receptorM2 + 1e-6);
        }
        expect(light.netNewM2 - light.removedM2).toBeCloseTo(
          light.sunBeforeM2 - light.sunAfterM2,
          6,
        );
      }),
      options,
    );
  });

  it('is the same when the scene and the sun turn together', () => {
    fc.assert(
      fc.property(
        seedArbitrary,
        sunArbitrary,
        fc.double({ min: 0, max: 360, noNaN: true }),
        (seed, sun, deg) => {
          const blocks = makeRandomTown(createSeededRandom(seed), 15);
          const turned = lightOf(
            mapRings(blocks, (ring) => turn(ring, deg)),
            turn(receptor, deg),
            { ...sun, azimuthDeg: sun.azimuthDeg + deg },
          );
          const straight = lightOf(blocks, receptor, sun);
          expect(turned.sunAfterM2).toBeCloseTo(straight.sunAfterM2, 5);
          expect(turned.netNewM2).toBeCloseTo(straight.netNewM2, 5);
        },
      ),
      options,
    );
  });

  it('is the same a metre further and a thousand kilometres from the origin', () => {
    fc.assert(
      fc.property(seedArbitrary, sunArbitrary, fc.constantFrom(1, 1e6), (seed, sun, shiftM) => {
        const blocks = makeRandomTown(createSeededRandom(seed), 15);
        const shifted = lightOf(
          mapRings(blocks, (ring) => move(ring, shiftM, -shiftM)),
          move(receptor, shiftM, -shiftM),
          sun,
        );
        // At 1e6 m a coordinate keeps 1e-10 m, and a long edge some more.
        expect(shifted.sunAfterM2).toBeCloseTo(lightOf(blocks, receptor, sun).sunAfterM2, 3);
      }),
      options,
    );
  });

  it('is mirrored with the mirrored scene and sun', () => {
    fc.assert(
      fc.property(seedArbitrary, sunArbitrary, (seed, sun) => {
        const blocks = makeRandomTown(createSeededRandom(seed), 15);
        const mirror = (ring: Ring): Ring => ring.map(([x, y]) => [x, -y]);
        const mirrored = lightOf(mapRings(blocks, mirror), mirror(receptor), {
          ...sun,
          azimuthDeg: 180 - sun.azimuthDeg,
        });
        expect(mirrored.sunAfterM2).toBeCloseTo(lightOf(blocks, receptor, sun).sunAfterM2, 6);
      }),
      options,
    );
  });

  it('never grows with a taller proposal, nor does net new shade with more context', () => {
    fc.assert(
      fc.property(seedArbitrary, sunArbitrary, (seed, sun) => {
        const blocks = makeRandomTown(createSeededRandom(seed), 20);
        const taller = blocks.map((block) =>
          block.role === 'proposed' ? { ...block, topM: block.topM + 7 } : block,
        );
        const light = lightOf(blocks, receptor, sun);
        expect(lightOf(taller, receptor, sun).sunAfterM2).toBeLessThanOrEqual(
          light.sunAfterM2 + 1e-6,
        );
        const denser = [...blocks, makeBlock([makeRectangle(-60, -60, 50, 9)], 0, 20, 'context')];
        expect(lightOf(denser, receptor, sun).netNewM2).toBeLessThanOrEqual(light.netNewM2 + 1e-6);
      }),
      options,
    );
  });

  it('adds up over the parts of an area, also where their borders lie on walls', () => {
    fc.assert(
      fc.property(
        seedArbitrary,
        sunArbitrary,
        fc.integer({ min: -30, max: 20 }),
        (seed, sun, cut) => {
          const blocks = makeRandomTown(createSeededRandom(seed), 20);
          const whole = lightOf(blocks, makeRectangle(-40, -40, 80, 80), sun).sunAfterM2;
          const west = lightOf(blocks, makeRectangle(-40, -40, cut + 40, 80), sun).sunAfterM2;
          const east = lightOf(blocks, makeRectangle(cut, -40, 40 - cut, 80), sun).sunAfterM2;
          expect(west + east).toBeCloseTo(whole, 5);
        },
      ),
      options,
    );
  });

  it('has no net new shade where the proposal equals what stands there', () => {
    fc.assert(
      fc.property(seedArbitrary, sunArbitrary, (seed, sun) => {
        const blocks = makeRandomTown(createSeededRandom(seed), 20).filter(
          ({ role }) => role !== 'proposed',
        );
        const same = blocks
          .filter(({ role }) => role === 'existing')
          .map((block): SceneBlock => ({ ...block, role: 'proposed' }));
        const light = lightOf([...blocks, ...same], receptor, sun);
        expect(light.netNewM2).toBe(0);
        expect(light.removedM2).toBe(0);
      }),
      options,
    );
  });

  it('knows a receptor with a hole', () => {
    const area = makeLitArea(
      [makeRectangle(0, 0, 10, 10), [...makeRectangle(4, 4, 2, 2)].reverse()],
      [],
    );
    const layer = castShadowLayer([], { azimuthDeg: 180, altitudeDeg: 30 }, 0);
    expect(measures.light(area, layer).sunAfterM2).toBeCloseTo(96, 9);
  });
});
