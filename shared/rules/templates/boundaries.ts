import { fromMemory, makeTemplate, type RuleTemplate } from './rule-template.ts';

const solstice = [{ event: 'december-solstice' as const }];

const levels = [
  { level: 1, near: 3, far: 2 },
  { level: 2, near: 4, far: 2.5 },
  { level: 3, near: 5, far: 3 },
] as const;

/** Rules that hold the proposal against a wall, or against its own shadow alone. */
export const boundaryTemplates: readonly RuleTemplate[] = [
  ...[
    { area: 'first', wallM: 3.66, words: '12 ft' },
    { area: 'second', wallM: 7.62, words: '25 ft' },
  ].map(({ area, wallM, words }) =>
    makeTemplate({
      id: `no-more-shade-than-a-fence-${area}-area`,
      title: `No more midwinter shade on a lot than a fence of ${words} would cast`,
      citation: 'Boulder, Colorado, B.R.C. 1981, 9-9-17, as cited elsewhere; check your own text',
      remark:
        'Two hours before to two hours after solar noon; the fence is that of the neighbour’s area.',
      clauses: [
        {
          receptors: { classes: ['parcel'] },
          days: solstice,
          window: { basis: 'solar', from: '10:00', to: '14:00' },
          measure: { kind: 'shade-share' },
          limit: { noWorse: true },
          baseline: { wall: wallM, with: ['context'] },
        },
      ],
    }),
  ),
  makeTemplate({
    id: 'no-more-shade-on-collectors-than-a-wall',
    title: 'No more shade on solar collectors than a wall of 10 ft would cast',
    citation: 'Henderson, Minnesota, 902.07(D)',
    clauses: [
      {
        receptors: { classes: ['collector'] },
        days: [{ date: '12-21' }],
        window: { basis: 'standard', from: '09:30', to: '14:30' },
        measure: { kind: 'shade-share' },
        limit: { noWorse: true },
        baseline: { wall: 3.05, with: ['context'] },
        disregard: { minutes: 0, area: 0.1 },
      },
    ],
  }),
  makeTemplate({
    id: 'no-more-shade-than-a-high-wall',
    title: 'No more shade on neighbours than a wall of 25 ft would cast, nine to three',
    citation: `Fort Collins, Colorado, Land Use Code, former 3.2.3; ${fromMemory}`,
    clauses: [
      {
        receptors: { classes: ['parcel'] },
        days: [{ date: '12-21' }],
        window: { basis: 'standard', from: '09:00', to: '15:00' },
        measure: { kind: 'shade-share' },
        limit: { noWorse: true },
        baseline: { wall: 7.62, with: ['context'] },
      },
    ],
  }),
  ...levels.map(({ level, near, far }) =>
    makeTemplate({
      id: `hours-of-shade-in-two-bands-${level}`,
      title: `At most ${near} hours of midwinter shade from 5 m beyond the boundary, ${far} from 10 m`,
      citation:
        'Japan, Building Standards Act, article 56-2 and table 4, as reproduced; check your own text',
      remark:
        'The plane is 4 m; 1.5 m and 6.5 m are used as well. Of the proposal alone: its neighbours do not count.',
      clauses: [
        { id: 'from-5-m', ring: { from: 5, to: 10 }, hours: near },
        { id: 'from-10-m', ring: { from: 10 }, hours: far },
      ].map(({ id, ring, hours }) => ({
        id,
        title: `At most ${hours} hours of shade ${ring.to === undefined ? 'beyond 10 m' : 'from 5 m to 10 m'}`,
        receptors: { ring, plane: 4, of: 'whole' as const },
        days: solstice,
        window: { basis: 'solar' as const, from: '08:00', to: '16:00' },
        step: 5,
        measure: { kind: 'worst-shade-hours' as const },
        limit: { atMost: hours },
        baseline: 'proposal-alone' as const,
      })),
    }),
  ),
  ...[
    { density: 'low', share: 0.25, words: 'a quarter' },
    { density: 'medium', share: 0.35, words: '35 %' },
    { density: 'high', share: 0.5, words: 'half' },
  ].map(({ density, share, words }) =>
    makeTemplate({
      id: `shadow-on-a-lot-at-noon-${density}-density`,
      title: `At most ${words} of a lot in the building’s shadow at midwinter noon`,
      citation: `Western Australia, R-Codes (SPP 7.3) volume 1, 5.4.2; ${fromMemory}`,
      remark: 'Of the building’s own shadow; what stands on the lot is not taken off.',
      clauses: [
        {
          receptors: { classes: ['parcel'], of: 'whole' },
          days: [{ event: 'winter-solstice' }],
          window: { basis: 'civil', from: '12:00', to: '12:00' },
          measure: { kind: 'shade-share' },
          limit: { atMost: share },
          baseline: 'proposal-alone',
        },
      ],
    }),
  ),
];
