import { fromMemory, makeTemplate, wholeDay, type RuleTemplate } from './rule-template.ts';

const collectors = { classes: ['collector' as const] };
/** A collector can be smaller than the square metre that is otherwise let pass. */
const heedsAll = { minutes: 0, area: 0 };

/** Rules on solar collectors and the roofs that could carry them. */
export const collectorTemplates: readonly RuleTemplate[] = [
  makeTemplate({
    id: 'collectors-shaded-by-no-more-than-a-tenth',
    title: 'No more than a tenth of a collector in shade at any time around noon',
    citation: 'California, Public Resources Code 25982; check your own text',
    remark: 'The law is about trees; here it is asked of buildings.',
    clauses: [
      {
        receptors: collectors,
        days: [{ year: true }],
        window: { basis: 'standard', from: '10:00', to: '14:00' },
        measure: { kind: 'shade-share' },
        limit: { atMost: 0.1 },
        disregard: heedsAll,
      },
    ],
  }),
  makeTemplate({
    id: 'roofs-keep-nine-tenths',
    title: 'Neighbours’ roofs keep nine tenths of their sun every day',
    citation: 'Sunnyvale, California, SMC 19.56.020; check your own text',
    remark:
      'First the December solstice, then every day. A roof is drawn as a collector. The hours of a single day are a mean over the roof, which loses the same share as its area times hours.',
    clauses: [
      {
        id: 'december',
        title: 'Nine tenths of the sun at the December solstice',
        receptors: collectors,
        days: [{ event: 'december-solstice' }],
        window: { basis: 'civil', from: '09:00', to: '15:00' },
        measure: { kind: 'sun-area-hours' },
        limit: { losesAtMostShare: 0.1, of: 'before' },
        disregard: heedsAll,
      },
      {
        id: 'every-day',
        title: 'Nine tenths of the sun on every day of the year',
        receptors: collectors,
        days: [{ year: true }],
        window: { basis: 'civil', from: '09:00', to: '15:00' },
        measure: { kind: 'sun-hours' },
        limit: { losesAtMostShare: 0.1, of: 'before' },
        disregard: heedsAll,
      },
    ],
  }),
  makeTemplate({
    id: 'collectors-lose-a-twentieth-a-year',
    title: 'Collectors lose at most a twentieth of their energy a year',
    citation: 'District of Columbia, 11-E DCMR 206.3; check your own text',
    remark:
      'The proposal of the text said “on an annual basis”; energy is of direct sun under a clear sky.',
    clauses: [
      {
        receptors: collectors,
        days: [{ year: true }],
        window: wholeDay,
        measure: { kind: 'beam-energy' },
        limit: { losesAtMostShare: 0.05, of: 'before' },
        disregard: heedsAll,
      },
    ],
  }),
];

const budgets = [
  { id: 'one-per-cent', share: 0.01, words: 'one hundredth' },
  { id: 'one-per-mille', share: 0.001, words: 'one thousandth' },
  { id: 'none', share: 0, words: 'none' },
] as const;

/** Rules on parks and squares. */
export const openSpaceTemplates: readonly RuleTemplate[] = [
  ...budgets.map(({ id, share, words }) =>
    makeTemplate({
      id: `park-budget-${id}`,
      title: `A park loses ${words} of the sun that a year could bring, counted in area times hours`,
      citation: `San Francisco, Planning Code 295 and the memorandum of 1989; ${fromMemory}`,
      remark:
        'Which budget holds hangs on the park’s size and on how much of it is in shade already.',
      clauses: [
        {
          receptors: { classes: ['open-space'] },
          days: [{ year: true }],
          window: { basis: 'sun', afterSunrise: 60, beforeSunset: 60 },
          measure: { kind: 'sun-area-hours' },
          limit: { losesAtMostShare: share, of: 'theoretical' },
        },
      ],
    }),
  ),
  makeTemplate({
    id: 'half-of-a-square-in-sun-at-noon',
    title: 'Half of a square in sun at noon in March',
    citation: 'Redwood City, California, downtown plan; check your own text',
    clauses: [
      {
        receptors: { classes: ['open-space'] },
        days: [{ date: '03-20' }],
        window: { basis: 'civil', from: '12:00', to: '12:00' },
        measure: { kind: 'shade-share' },
        limit: { atMost: 0.5 },
      },
    ],
  }),
];
