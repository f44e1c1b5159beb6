import { describe, expect, it } from 'vitest';
import { createLightMeasures, makeLitArea } from '../../../shared/shadow/receptor-light.ts';
import { castBlockContours } from '../../../shared/shadow/shadow-contours.ts';
import { castShadowLayer, type SceneBlock } from '../../../shared/shadow/shadow-layer.ts';
import { makeSunFrame } from '../../../shared/shadow/sun-frame.ts';
import { makeBlock, makeRectangle } from '../../support/plane-scenes.ts';

const measures = createLightMeasures();
const field = makeLitArea([makeRectangle(-500, -500, 1000, 1000)], []);

/** The area in m² that blocks shade on a field much larger than their shadows. */
function shadedM2(blocks: SceneBlock[], azimuthDeg: number, altitudeDeg: number, planeM = 0) {
  const layer = castShadowLayer(blocks, { azimuthDeg, altitudeDeg }, planeM);
  return 1_000_000 - measures.light(field, layer).sunAfterM2;
}

// All expected areas are worked out by hand from length = height / tan(altitude).
describe('the shadow of', () => {
  it('a pole is its height over the tangent of the altitude long, away from the sun', () => {
    const pole = makeBlock([makeRectangle(-0.005, -0.005, 0.01, 0.01)], 0, 10);
    const [contour = []] = castBlockContours(pole, { azimuthDeg: 135, altitudeDeg: 30 }, 0);
    const tip = contour.reduce((far, point) =>
      point[1] - point[0] > far[1] - far[0] ? point : far,
    );
    const lengthM = 10 / Math.tan(Math.PI / 6);
    // The sun in the south-east throws the shadow to the north-west.
    expect(tip[0]).toBeCloseTo(-lengthM / Math.SQRT2, 1);
    expect(tip[1]).toBeCloseTo(lengthM / Math.SQRT2, 1);
  });

  it('a box at noon with the sun at 45 degrees is its footprint and one height to the north', () => {
    const box = makeBlock([makeRectangle(0, 0, 20, 10)], 0, 12);
    expect(shadedM2([box], 180, 45)).toBeCloseTo(20 * (10 + 12), 8);
  });

  it('a box at noon in the southern hemisphere falls to the south by the same area', () => {
    const box = makeBlock([makeRectangle(0, 0, 20, 10)], 0, 12);
    const south = makeLitArea([makeRectangle(0, -12, 20, 12)], []);
    const layer = castShadowLayer([box], { azimuthDeg: 0, altitudeDeg: 45 }, 0);
    expect(measures.light(south, layer).sunAfterM2).toBeCloseTo(0, 8);
    expect(shadedM2([box], 0, 45)).toBeCloseTo(20 * 22, 8);
  });

  it('an overhang stands off its footprint by its base', () => {
    const slab = makeBlock([makeRectangle(0, 0, 20, 10)], 30, 33);
    // From y = 30 to y = 10 + 33.
    expect(shadedM2([slab], 180, 45)).toBeCloseTo(20 * 13, 8);
    const under = makeLitArea([makeRectangle(0, 0, 20, 10)], []);
    const layer = castShadowLayer([slab], { azimuthDeg: 180, altitudeDeg: 45 }, 0);
    expect(measures.light(under, layer).sunAfterM2).toBeCloseTo(200, 8);
  });

  it('a courtyard leaves the part of the yard that the sun reaches', () => {
    const ring = [makeRectangle(0, 0, 40, 40), makeRectangle(10, 10, 20, 20)];
    const block = makeBlock(ring, 0, 5);
    const yard = makeLitArea([makeRectangle(10, 10, 20, 20)], []);
    const layer = castShadowLayer([block], { azimuthDeg: 180, altitudeDeg: 45 }, 0);
    // The south wing shades 5 m of the 20 m deep yard.
    expect(measures.light(yard, layer).sunAfterM2).toBeCloseTo(20 * 15, 8);
  });

  it('a tower on a podium counts once where the two overlap', () => {
    const podium = makeBlock([makeRectangle(0, 0, 40, 20)], 0, 10);
    const tower = makeBlock([makeRectangle(10, 5, 10, 10)], 10, 50);
    // Podium: 40 × (20 + 10). Tower from base to top: y from 15 to 65, 10 wide; 15 of it over the
    // podium's shadow, which ends at y = 30.
    expect(shadedM2([podium, tower], 180, 45)).toBeCloseTo(40 * 30 + 10 * (65 - 30), 8);
  });

  it('a block on a roof is shorter by the height of the roof', () => {
    const box = makeBlock([makeRectangle(0, 0, 20, 10)], 0, 12);
    expect(shadedM2([box], 180, 45, 8)).toBeCloseTo(20 * (10 + 4), 8);
    expect(shadedM2([box], 180, 45, 12)).toBeCloseTo(0, 8);
  });

  // 12 ft and 25 ft at 40.015° N, two hours from noon of the winter solstice: altitude 20.656°,
  // length 2.6525 heights (closed form, declination −23.44°): 31.83 ft and 66.31 ft.
  it('a wall two hours from noon at midwinter is 2.65 heights long', () => {
    const { cotangent } = makeSunFrame({ azimuthDeg: 150.643, altitudeDeg: 20.656 });
    expect(cotangent * 12).toBeCloseTo(31.83, 1);
    expect(cotangent * 25).toBeCloseTo(66.31, 1);
  });
});
