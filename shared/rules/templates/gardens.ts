import { fromMemory, makeTemplate, wholeDay, type RuleTemplate } from './rule-template.ts';

const amenity = { classes: ['yard', 'open-space'] as const };
const march21 = [{ date: '03-21' }];

/** Rules on gardens, yards and private open space. */
export const gardenTemplates: readonly RuleTemplate[] = [
  makeTemplate({
    id: 'two-hours-on-half-of-a-garden',
    title: 'Two hours of sun on half of a garden or amenity space in March',
    citation: `BRE, Site layout planning for daylight and sunlight (BR 209), 2011 and 2022; ${fromMemory}`,
    remark: 'Advisory; sun at 10° or below does not count. 21 March is in winter time in Britain.',
    clauses: [
      {
        receptors: { classes: [...amenity.classes] },
        days: march21,
        window: wholeDay,
        minimumAltitude: 10,
        measure: { kind: 'sun-share', hours: 2 },
        limit: { anyOf: [{ atLeast: 0.5 }, { keeps: 0.8 }] },
      },
    ],
  }),
  makeTemplate({
    id: 'no-more-than-two-fifths-in-permanent-shadow',
    title: 'No more than two fifths of a garden without any sun in March',
    citation:
      'BRE, Site layout planning for daylight and sunlight (BR 209), 1991, as quoted elsewhere; check your own text',
    remark: 'The edition of 2011 has another test.',
    clauses: [
      {
        receptors: { classes: [...amenity.classes] },
        days: march21,
        window: wholeDay,
        measure: { kind: 'sun-share', hours: 0 },
        limit: { anyOf: [{ atLeast: 0.6 }, { keeps: 0.8 }] },
      },
    ],
  }),
  makeTemplate({
    id: 'three-midwinter-hours-on-half-of-a-yard',
    title: 'Three midwinter hours of sun on half of a yard, or no less than now',
    citation:
      'New South Wales development control plans, for example Camden DCP 4.2.8; check your own text',
    remark: 'Where a yard has less before, the sun that it has is kept.',
    clauses: [
      {
        receptors: { classes: ['yard'] },
        days: [{ event: 'winter-solstice' }],
        window: { basis: 'standard', from: '09:00', to: '15:00' },
        measure: { kind: 'sun-share', hours: 3 },
        limit: { anyOf: [{ atLeast: 0.5 }, { noWorse: true }] },
      },
    ],
  }),
  makeTemplate({
    id: 'three-midwinter-hours-or-four-fifths',
    title: 'Three midwinter hours of sun on half of a yard, or four fifths of what there was',
    citation: `New South Wales, Apartment Design Guide (2015), objective 3B-2; ${fromMemory}`,
    remark:
      'The guide lets a fifth go only where a neighbour lacks the hours already; here it is let go in any case.',
    clauses: [
      {
        receptors: { classes: ['yard'] },
        days: [{ event: 'winter-solstice' }],
        window: { basis: 'standard', from: '09:00', to: '15:00' },
        measure: { kind: 'sun-share', hours: 3 },
        limit: { anyOf: [{ atLeast: 0.5 }, { keeps: 0.8 }] },
      },
    ],
  }),
  makeTemplate({
    id: 'five-hours-on-three-quarters-or-forty-square-metres',
    title: 'Five hours of sun on three quarters or 40 m² of a yard, whichever is less',
    citation:
      'Victoria Planning Provisions, clause 55.04-5, standard B21, as quoted in VCAT reports; check your own text',
    remark: 'The least width of 3 m is not judged. A yard that has less before keeps what it has.',
    clauses: [
      {
        receptors: { classes: ['yard'] },
        days: [{ date: '09-22' }],
        window: { basis: 'standard', from: '09:00', to: '15:00' },
        measure: { kind: 'sun-share', hours: 5 },
        limit: {
          anyOf: [
            { atLeast: 0.75 },
            { atLeast: 40, measure: { kind: 'sun-area', hours: 5 } },
            { noWorse: true },
          ],
        },
      },
    ],
  }),
  makeTemplate({
    id: 'no-net-new-shadow-of-many-hours',
    title: 'No net new shadow of more than three hours in winter, four in summer',
    citation: `City of Los Angeles, CEQA Thresholds Guide (2006), A.3; ${fromMemory}`,
    remark:
      'The hours are a mean over the area; winter hours are in standard time, summer hours by the clock.',
    clauses: [
      {
        id: 'winter-half',
        title: 'A loss of at most three hours from late October to early April',
        receptors: { classes: ['yard', 'open-space', 'collector'] },
        days: [{ date: '12-21' }, { date: '03-21' }],
        window: { basis: 'standard', from: '09:00', to: '15:00' },
        measure: { kind: 'sun-hours' },
        limit: { losesAtMost: 3 },
      },
      {
        id: 'summer-half',
        title: 'A loss of at most four hours from early April to late October',
        receptors: { classes: ['yard', 'open-space', 'collector'] },
        days: [{ date: '06-21' }, { date: '09-21' }],
        window: { basis: 'civil', from: '09:00', to: '17:00' },
        measure: { kind: 'sun-hours' },
        limit: { losesAtMost: 4 },
      },
    ],
  }),
];
