import { cleanup, render } from '@testing-library/react';
import { afterEach, describe, expect, it } from 'vitest';
import { NoonMark } from '../../../web/components/noon-mark.tsx';

/** How far above the foot of the upright the bar crosses it, as a share of the upright. */
function barHeight(noonAltitudeDeg: number): number {
  const { container } = render(<NoonMark noonAltitudeDeg={noonAltitudeDeg} />);
  const path = container.querySelector('path')?.getAttribute('d') ?? '';
  const match = /^M10 ([\d.]+)V([\d.]+)M5 ([\d.]+)H15$/.exec(path);
  if (match === null) throw new Error(`The mark is drawn otherwise: ${path}`);
  const [top, foot, bar] = match.slice(1).map(Number) as [number, number, number];
  cleanup();
  return (foot - bar) / (foot - top);
}

afterEach(cleanup);

describe('the mark', () => {
  it('bears its bar at the noon sun’s share of a right angle', () => {
    expect(barHeight(45)).toBeCloseTo(0.5, 2);
    expect(barHeight(18)).toBeCloseTo(0.2, 2);
  });

  it('keeps its bar on the upright where the sun stays down', () => {
    expect(barHeight(-5)).toBe(0);
  });
});
