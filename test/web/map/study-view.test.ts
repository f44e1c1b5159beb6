import { describe, expect, it } from 'vitest';
import {
  clockOf,
  defaultDate,
  listJudgedWindows,
  parseStudyView,
  resolveInstant,
  writeStudyView,
  type StudyDays,
} from '../../../web/map/study-view.ts';

const search = (text: string) => new URLSearchParams(text);

const study: StudyDays = {
  timeZone: 'America/Chicago',
  keyDates: [
    { event: 'march-equinox', date: '2026-03-20' },
    { event: 'june-solstice', date: '2026-06-21' },
    { event: 'september-equinox', date: '2026-09-22' },
    { event: 'december-solstice', date: '2026-12-21' },
  ],
  rule: {
    clauses: [
      {
        title: 'Two hours at noon in winter',
        days: [
          {
            date: '2026-12-21',
            fromAt: '2026-12-21T10:00:00-06:00',
            toAt: '2026-12-21T14:00:00-06:00',
          },
        ],
      },
      {
        title: 'The same hours once more',
        days: [
          {
            date: '2026-12-21',
            fromAt: '2026-12-21T10:00:00-06:00',
            toAt: '2026-12-21T14:00:00-06:00',
          },
        ],
      },
    ],
  },
};

describe('the view in the address', () => {
  it('comes back as it was written', () => {
    const view = {
      date: '2026-12-21',
      time: '11:45',
      layer: 'net-new',
      receptor: 'P-0121',
    } as const;
    expect(parseStudyView(writeStudyView(search(''), view))).toEqual(view);
  });

  it('keeps what else stands in the address', () => {
    const written = writeStudyView(search('view=17/46/-91&time=09:00'), { time: '09:05' });
    expect(written.get('view')).toBe('17/46/-91');
    expect(written.get('time')).toBe('09:05');
  });

  it('stays short: what is the default is not written', () => {
    expect(writeStudyView(search('layer=before'), { layer: 'after' }).toString()).toBe('');
    expect(writeStudyView(search('receptor=P-1'), { receptor: null }).toString()).toBe('');
  });

  it('leaves out what is no date, no time and no layer', () => {
    expect(parseStudyView(search('date=2026-02-30&time=25:00&layer=x'))).toEqual({
      date: null,
      time: null,
      layer: 'after',
      receptor: null,
    });
  });
});

describe('what a study shows first', () => {
  it('is the key date that the rule judges', () => {
    expect(defaultDate(study)).toBe('2026-12-21');
  });

  it('is a day of the rule where no key date is judged, and else the last key date', () => {
    const january = { date: '2026-01-20', fromAt: '', toAt: '' };
    const clauses = [{ title: 'The great cold', days: [january] }];
    expect(defaultDate({ ...study, rule: { clauses } })).toBe('2026-01-20');
    expect(defaultDate({ ...study, rule: { clauses: [] } })).toBe('2026-12-21');
  });

  it('is the middle of the judged hours, and the highest sun of other days', () => {
    const noonMs = Date.parse('2026-06-21T13:07:00-05:00');
    const judgedMs = resolveInstant(study, '2026-12-21', null, noonMs);
    expect(new Date(judgedMs).toISOString()).toBe('2026-12-21T18:00:00.000Z');
    expect(resolveInstant(study, '2026-06-21', null, noonMs)).toBe(noonMs);
  });

  it('is the clock’s own time where the address names one, in summer time too', () => {
    const atMs = resolveInstant(study, '2026-06-21', '09:30', 0);
    expect(new Date(atMs).toISOString()).toBe('2026-06-21T14:30:00.000Z');
    expect(clockOf(atMs, study.timeZone)).toBe('09:30');
  });
});

describe('listJudgedWindows', () => {
  it('gives a window once though two clauses judge in it', () => {
    expect(listJudgedWindows(study, '2026-12-21')).toHaveLength(1);
  });

  it('gives none for a day that is not judged', () => {
    expect(listJudgedWindows(study, '2026-06-21')).toEqual([]);
  });
});
