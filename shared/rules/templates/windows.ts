import { fromMemory, makeTemplate, wholeDay, type RuleTemplate } from './rule-template.ts';

const windows = { classes: ['window' as const] };

const exposureLevels = [
  { level: 'minimum', hours: 1.5, words: 'An hour and a half' },
  { level: 'medium', hours: 3, words: 'Three hours' },
  { level: 'high', hours: 4, words: 'Four hours' },
] as const;

const equinoxes = [{ event: 'march-equinox' as const }, { event: 'september-equinox' as const }];

const equinoxHours = [
  { id: 'dwellings', words: 'Three equinox hours', from: '07:00', to: '17:00', hours: 3 },
  { id: 'schools', words: 'Three equinox school hours', from: '08:00', to: '16:00', hours: 3 },
  {
    id: 'infill',
    words: 'An equinox hour and a half, in the inner city,',
    from: '07:00',
    to: '17:00',
    hours: 1.5,
  },
] as const;

/** Rules on the sun that reaches a window. */
export const windowTemplates: readonly RuleTemplate[] = [
  ...exposureLevels.map(({ level, hours, words }) =>
    makeTemplate({
      id: `window-exposure-${level}`,
      title: `${words} of sun at a window on a day in early spring`,
      citation: `EN 17037:2018, 5.3 and annex D, level ${level}; ${fromMemory}`,
      remark:
        'The day is any one from 1 February to 21 March; here it is the last. The lowest sun that counts hangs on the place: 13° is used in the Czech Republic; set your own.',
      clauses: [
        {
          receptors: windows,
          days: [{ date: '03-21' }],
          window: wholeDay,
          minimumAltitude: 13,
          step: 5,
          measure: { kind: 'sun-hours' },
          limit: { atLeast: hours },
        },
      ],
    }),
  ),
  ...equinoxHours.map(({ id, words, from, to, hours }) =>
    makeTemplate({
      id: `equinox-hours-${id}`,
      title: `${words} of sun at a window`,
      citation:
        'Poland, regulation on technical conditions for buildings, §60, as reported in the press; check your own text',
      remark:
        'The text names no measuring method and no clock: here the civil one. One room of a dwelling is enough, which is for the reader to see.',
      clauses: [
        {
          receptors: windows,
          days: equinoxes,
          window: { basis: 'civil', from, to },
          step: 5,
          measure: { kind: 'sun-hours' },
          limit: { atLeast: hours },
        },
      ],
    }),
  ),
  makeTemplate({
    id: 'two-hours-on-the-great-cold-day',
    title: 'Two hours of sun at a window sill on the great-cold day',
    citation: 'China, GB 50180-2018, 4.0.9 with its table, as reproduced; check your own text',
    remark: 'For large cities of the colder zones; other cities there ask for three hours.',
    clauses: [
      {
        receptors: windows,
        days: [{ date: '01-20' }],
        window: { basis: 'solar', from: '08:00', to: '16:00' },
        step: 5,
        measure: { kind: 'sun-hours' },
        limit: { atLeast: 2 },
      },
    ],
  }),
  makeTemplate({
    id: 'one-hour-at-the-winter-solstice',
    title: 'One hour of sun at a window sill at the winter solstice',
    citation: 'China, GB 50180-2018, 4.0.9 with its table, as reproduced; check your own text',
    remark: 'For the warmer zones.',
    clauses: [
      {
        receptors: windows,
        days: [{ event: 'december-solstice' }],
        window: { basis: 'solar', from: '09:00', to: '15:00' },
        step: 5,
        measure: { kind: 'sun-hours' },
        limit: { atLeast: 1 },
      },
    ],
  }),
];
