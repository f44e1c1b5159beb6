import { describe, expect, it } from 'vitest';
import { createCivilTimeFormat } from '../../../shared/drawing/civil-time-format.ts';
import { createFigureFormat } from '../../../shared/drawing/figure-format.ts';
import { drawLedger } from '../../../shared/drawing/ledger-drawing.ts';
import type { LedgerDay, SunLedger } from '../../../shared/receptors/sun-ledger-schema.ts';

const none = { before: 0, after: 0, lost: 0 };

/** Sun on the whole area from 8 to 16 o'clock before; after, the proposal takes it from 11 to 13. */
const day: LedgerDay = {
  date: '2026-12-21',
  event: 'december-solstice',
  sunriseAt: '2026-12-21T08:00:00-06:00',
  sunsetAt: '2026-12-21T16:00:00-06:00',
  sunHours: { before: 8, after: 6, lost: 2 },
  areaHoursM2h: none,
  beamEnergyKwhM2: none,
  lostSpans: [{ fromAt: '2026-12-21T11:00:00-06:00', toAt: '2026-12-21T13:00:00-06:00' }],
  hours: [],
  samples: Array.from({ length: 97 }, (_, index) => {
    const minutes = 8 * 60 + index * 5;
    const clock = `${String(Math.floor(minutes / 60)).padStart(2, '0')}:${String(minutes % 60).padStart(2, '0')}`;
    return {
      at: `2026-12-21T${clock}:00-06:00`,
      altitudeDeg: 10,
      shareBefore: 1,
      shareAfter: minutes > 11 * 60 && minutes < 13 * 60 ? 0 : 1,
    };
  }),
};

const ledger: SunLedger = {
  receptor: 'r1',
  class: 'yard',
  label: 'Rear yard, 12 <Tallowreed> Row',
  planeM: 0,
  openAreaM2: 120,
  stepMin: 5,
  days: [day],
};

const options = {
  width: 480,
  time: createCivilTimeFormat('en-US', 'America/Chicago'),
  figures: createFigureFormat('en-US'),
  judged: [{ fromAt: '2026-12-21T10:00:00-06:00', toAt: '2026-12-21T14:00:00-06:00' }],
  hasFigures: true,
};

const toX = (svg: string, hour: string) =>
  Number(new RegExp(`<text x="([\\d.]+)"[^>]*>${hour}</text>`).exec(svg)?.[1]);

describe('drawLedger', () => {
  const svg = drawLedger(ledger, options);

  it('hatches what is lost, at its hours and nowhere else', () => {
    const lost = [...svg.matchAll(/data-part="lost-hatch" d="([^"]*)"/g)];
    expect(lost).toHaveLength(1);
    const xs = [...(lost[0]?.[1] ?? '').matchAll(/[ML](-?[\d.]+) /g)].map(([, x]) => Number(x));
    const hour = (toX(svg, '2') - toX(svg, 'noon')) / 2;
    const eleven = toX(svg, 'noon') - hour;
    const one = toX(svg, 'noon') + hour;
    expect(Math.min(...xs)).toBeGreaterThanOrEqual(eleven - 0.2);
    expect(Math.min(...xs)).toBeLessThan(eleven + 4);
    expect(Math.max(...xs)).toBeLessThanOrEqual(one + 0.2);
    expect(Math.max(...xs)).toBeGreaterThan(one - 4);
  });

  it('shades the judged window from its first to its last instant', () => {
    const [, x, width] =
      /data-part="window" x="([\d.]+)" y="[\d.]+" width="([\d.]+)"/.exec(svg) ?? [];
    const hour = (toX(svg, '2') - toX(svg, 'noon')) / 2;
    expect(Number(x)).toBeCloseTo(toX(svg, '10'), 1);
    expect(Number(width)).toBeCloseTo(4 * hour, 1);
  });

  it('writes day, zone and the hours before, after and lost', () => {
    for (const words of ['Dec 21', 'CST', '8 h 00 min', '6 h 00 min', '2 h 00 min']) {
      expect(svg).toContain(`>${words}</text>`);
    }
  });

  it('hatches nothing where nothing is lost, and says none', () => {
    const kept = drawLedger(
      {
        ...ledger,
        days: [
          {
            ...day,
            sunHours: { before: 8, after: 8, lost: 0 },
            samples: day.samples.map((sample) => ({ ...sample, shareAfter: 1 })),
          },
        ],
      },
      options,
    );
    expect(kept).not.toContain('lost-hatch');
    expect(kept).toContain('>none</text>');
  });

  it('says what is gained where the proposal lets more sun in', () => {
    const gained = drawLedger(
      { ...ledger, days: [{ ...day, sunHours: { before: 6, after: 6.5, lost: -0.5 } }] },
      options,
    );
    expect(gained).toContain('>gains 30 min</text>');
  });

  it('draws a day on which the sun does not rise', () => {
    const dark = drawLedger(
      { ...ledger, days: [{ ...day, sunriseAt: null, sunsetAt: null, samples: [] }] },
      options,
    );
    expect(dark).toContain('the sun does not rise');
    expect(dark).not.toContain('NaN');
    expect(dark).not.toContain('Infinity');
  });

  it('escapes the name of the receptor', () => {
    expect(svg).toContain('12 &lt;Tallowreed&gt; Row');
  });
});
