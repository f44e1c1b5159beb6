import { distance } from '@turf/turf';
import { describe, expect, it } from 'vitest';
import { createFigureFormat } from '../../../shared/drawing/figure-format.ts';
import {
  drawPlan,
  emptyPlan,
  type PlanContent,
  type PlanOptions,
} from '../../../shared/drawing/plan-drawing.ts';
import type { Polygonal } from '../../../shared/geometry/geojson-schema.ts';

const options: PlanOptions = {
  origin: { longitude: -91.3, latitude: 46.75 },
  extent: [-91.303, 46.748, -91.297, 46.752],
  width: 600,
  label: 'A plan',
  figures: createFigureFormat('en-US'),
  detail: 'sheet',
  titleBlock: [['2026-0001 · revision 1', 'study 7f3a 91c2']],
};

function box(west: number, south: number, east: number, north: number): Polygonal {
  return {
    type: 'Polygon',
    coordinates: [
      [
        [west, south],
        [east, south],
        [east, north],
        [west, north],
        [west, south],
      ],
    ],
  };
}

const content: PlanContent = {
  ...emptyPlan,
  streets: [{ name: 'Quillonbrook Street', geometry: box(-91.303, 46.7512, -91.297, 46.7514) }],
  streetLines: [
    {
      name: 'Quillonbrook Street',
      lines: [
        [
          [-91.303, 46.7513],
          [-91.297, 46.7513],
        ],
      ],
    },
  ],
  buildings: [box(-91.302, 46.75, -91.3017, 46.7503)],
  site: [box(-91.3005, 46.7492, -91.2995, 46.7499)],
  proposal: [
    { geometry: box(-91.3004, 46.7493, -91.2996, 46.7498), topM: 14 },
    { geometry: box(-91.3, 46.7494, -91.2997, 46.7497), topM: 44 },
  ],
  shadows: {
    standing: box(-91.302, 46.7503, -91.3017, 46.7506),
    netNew: box(-91.3004, 46.75, -91.2996, 46.751),
  },
  notMet: [{ geometry: box(-91.3004, 46.7502, -91.2999, 46.7509), mark: '7' }],
};

function pathOf(svg: string, part: string): string {
  const path = new RegExp(`data-part="${part}" d="([^"]*)"`).exec(svg)?.[1];
  if (path === undefined) throw new Error(`The drawing has no ${part}.`);
  return path;
}

function pointsOf(path: string): [number, number][] {
  return [...path.matchAll(/(-?[\d.]+) (-?[\d.]+)/g)].map(([, x, y]) => [Number(x), Number(y)]);
}

const extremes = (points: [number, number][]) => {
  const xs = points.map(([x]) => x);
  const ys = points.map(([, y]) => y);
  return {
    left: Math.min(...xs),
    right: Math.max(...xs),
    top: Math.min(...ys),
    bottom: Math.max(...ys),
  };
};

describe('drawPlan', () => {
  const svg = drawPlan(content, options);

  it('hatches the net new shadow where it lies and nowhere else', () => {
    const area = extremes(pointsOf(pathOf(svg, 'net-new-shadow')));
    const hatch = extremes(pointsOf(pathOf(svg, 'net-new-hatch')));
    expect(hatch.left).toBeGreaterThanOrEqual(area.left - 0.1);
    expect(hatch.right).toBeLessThanOrEqual(area.right + 0.1);
    expect(hatch.top).toBeGreaterThanOrEqual(area.top - 0.1);
    expect(hatch.bottom).toBeLessThanOrEqual(area.bottom + 0.1);
    // The hatch reaches into every corner, to one spacing.
    expect(hatch.left - area.left).toBeLessThan(8);
    expect(area.right - hatch.right).toBeLessThan(8);
    expect(area.bottom - area.top - (hatch.bottom - hatch.top)).toBeLessThan(8);
  });

  it('puts north up: a shadow north of the proposal lies above it', () => {
    const proposal = extremes(pointsOf(pathOf(svg, 'proposal')));
    const shadow = extremes(pointsOf(pathOf(svg, 'net-new-shadow')));
    expect(shadow.bottom).toBeLessThan(proposal.top);
  });

  it('has a scale bar that is right to 1 % against a distance on the sphere', () => {
    const length = /data-part="scale-bar"><path d="M[\d.]+ [\d.]+h([\d.]+)/.exec(svg)?.[1];
    const metres = />(\d+) m<\/text><\/g>/.exec(svg)?.[1];
    const site = extremes(pointsOf(pathOf(svg, 'site')));
    const siteM = distance([-91.3005, 46.7492], [-91.2995, 46.7492], { units: 'meters' });
    const pxPerM = (site.right - site.left) / siteM;
    expect(Number(length) / Number(metres) / pxPerM).toBeGreaterThan(0.99);
    expect(Number(length) / Number(metres) / pxPerM).toBeLessThan(1.01);
  });

  it('writes heights, true north, street names, marks and the title block', () => {
    for (const words of [
      '+14.0 m',
      '+44.0 m',
      'true north',
      'Quillonbrook Street',
      '>7</text>',
      '2026-0001 · revision 1',
      'study 7f3a 91c2',
    ]) {
      expect(svg).toContain(words);
    }
  });

  it('escapes names that hold markup', () => {
    const named = drawPlan(
      {
        ...content,
        water: [{ name: '<b>&"', geometry: box(-91.303, 46.748, -91.301, 46.7495) }],
      },
      options,
    );
    expect(named).toContain('&lt;b&gt;&amp;&quot;');
    expect(named).not.toContain('<b>');
  });

  it('leaves words and marks out of a small plan, and keeps the shadows', () => {
    const small = drawPlan(content, { ...options, width: 150, detail: 'small' });
    expect(small).not.toContain('<text');
    expect(pathOf(small, 'net-new-hatch')).not.toBe('');
  });

  it('writes marks alone on a keyed plan', () => {
    const keyed = drawPlan(content, { ...options, detail: 'keyed' });
    expect(keyed.match(/<text/g)).toHaveLength(1);
    expect(keyed).toContain('>7</text>');
  });

  it('draws the chosen receptor in the colour of the sun', () => {
    const chosen = drawPlan(
      { ...content, chosen: box(-91.3004, 46.7502, -91.2999, 46.7509) },
      options,
    );
    expect(chosen).toMatch(/data-part="chosen"[^>]*stroke="#966400"/);
  });

  it('draws a plan with nothing on it', () => {
    const empty = drawPlan(emptyPlan, { ...options, titleBlock: [] });
    expect(empty).toContain('true north');
    expect(empty).not.toContain('data-part="shadows"');
  });

  it('needs no ids, patterns or clip paths, so that drawings can stand in one page', () => {
    expect(svg).not.toMatch(/ id="|<pattern|<clipPath|url\(/);
  });

  it('gives the same text for the same content', () => {
    expect(drawPlan(structuredClone(content), options)).toBe(svg);
  });
});
