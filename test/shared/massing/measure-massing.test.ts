import { describe, expect, it } from 'vitest';
import { measureMassing } from '../../../shared/massing/measure-massing.ts';
import { block, rectangle, ring, type Point } from './drawn-massing.ts';

const podium = block('podium', [rectangle(10, 10, 40, 30)], { topM: 12, storeys: 3 });
const tower = block('tower', [rectangle(15, 15, 20, 20)], { baseM: 12, topM: 45, storeys: 14 });
const old = block('old', [rectangle(0, 0, 50, 50)], { role: 'existing', topM: 80, storeys: 30 });

describe('measureMassing', () => {
  it('measures what is proposed and only counts what is there', () => {
    const figures = measureMassing([podium, tower, old]);
    expect(figures).toMatchObject({
      proposedBlocks: 2,
      existingBlocks: 1,
      heightM: 45,
      storeys: 14,
    });
    // 40 · 30; the tower stands on it. 40 · 30 · 12 + 20 · 20 · 33.
    expect(figures.footprintM2).toBeCloseTo(1200, 2);
    expect(figures.volumeM3).toBeCloseTo(27_600, 0);
  });

  it('counts ground once where blocks lie over it, overhangs included', () => {
    const wing = block('wing', [rectangle(40, 10, 20, 10)], { baseM: 12, topM: 20 });
    expect(measureMassing([podium, wing]).footprintM2).toBeCloseTo(1300, 2);
  });

  it('leaves courtyards out', () => {
    const court = block('court', [rectangle(0, 0, 30, 30), rectangle(10, 10, 10, 10).reverse()]);
    const { footprintM2, volumeM3 } = measureMassing([court]);
    expect(footprintM2).toBeCloseTo(800, 2);
    expect(volumeM3).toBeCloseTo(8000, 1);
  });

  it('measures the same whichever way a ring runs and wherever it begins', () => {
    const turned = block('podium', [ring([50, 40], [50, 10], [10, 10], [10, 40])], { topM: 12 });
    expect(measureMassing([turned]).footprintM2).toBeCloseTo(1200, 2);
  });

  it('takes the height from the lowest base', () => {
    const cellar = block('cellar', [rectangle(10, 10, 10, 10)], { baseM: -6, topM: 0 });
    expect(measureMassing([podium, cellar]).heightM).toBe(18);
  });

  it('takes the storeys of the highest block, and the larger number of two', () => {
    expect(measureMassing([podium, { ...tower, storeys: null }]).storeys).toBeNull();
    expect(measureMassing([tower, { ...tower, id: 'b', storeys: 13 }]).storeys).toBe(14);
  });

  it('has no height, storeys or area where nothing is proposed', () => {
    expect(measureMassing([old])).toEqual({
      proposedBlocks: 0,
      existingBlocks: 1,
      heightM: null,
      storeys: null,
      footprintM2: 0,
      volumeM3: 0,
    });
  });

  it('gives no figure from heights that are not numbers', () => {
    expect(measureMassing([{ ...podium, topM: NaN }])).toMatchObject({
      heightM: null,
      volumeM3: null,
    });
  });

  it('gives no area for a tangle that cannot be measured', () => {
    const star = Array.from({ length: 5001 }, (_, index): Point => {
      const turn = (index * 2500 * 2 * Math.PI) / 5001;
      return [50 + 30 * Math.cos(turn), 40 + 30 * Math.sin(turn)];
    });
    expect(measureMassing([block('star', [ring(...star)])])).toMatchObject({
      footprintM2: null,
      volumeM3: null,
    });
  });
});
