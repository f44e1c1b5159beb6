import { describe, expect, it } from 'vitest';
import { describeLedgerDay } from '../../../../web/features/studies/sun-sentence.ts';
import { larkhavenFormats, withPlainSpaces } from '../../support/render-in-place.tsx';

type Day = Parameters<typeof describeLedgerDay>[0];

function dayOf(before: number, after: number, lostSpans: Day['lostSpans'] = []): Day {
  return {
    date: '2026-12-21',
    sunHours: { before, after, lost: before - after },
    lostSpans,
    sunriseAt: '2026-12-21T07:49:00-06:00',
    samples: [],
  };
}

const lateMorning = { fromAt: '2026-12-21T11:30:00-06:00', toAt: '2026-12-21T13:10:00-06:00' };

function sentenceOf(day: Day, receptorClass = 'yard'): string {
  const parts = describeLedgerDay(day, receptorClass, larkhavenFormats);
  return withPlainSpaces(parts.map(({ text }) => text).join(''));
}

describe('the sentence of a day', () => {
  it('says what is there, what stays, and from when to when it is lost', () => {
    expect(sentenceOf(dayOf(3 + 5 / 60, 1 + 25 / 60, [lateMorning]))).toBe(
      'On December 21 this yard has 3 h 05 min of sun now, and 1 h 25 min with the proposal; it is lost between 11:30 a.m. and 1:10 p.m.',
    );
  });

  it('names every stretch', () => {
    const afternoon = { fromAt: '2026-12-21T15:00:00-06:00', toAt: '2026-12-21T15:25:00-06:00' };
    expect(sentenceOf(dayOf(4, 2, [lateMorning, afternoon]))).toContain(
      'between 11:30 a.m. and 1:10 p.m., and between 3:00 p.m. and 3:25 p.m.',
    );
  });

  it('says that all of it stays where nothing is lost', () => {
    expect(sentenceOf(dayOf(2, 2), 'parcel')).toBe(
      'On December 21 this parcel has 2 h 00 min of sun now, and keeps all of it with the proposal.',
    );
  });

  it('says none, not zero, where all of it is lost', () => {
    expect(sentenceOf(dayOf(2, 0, [lateMorning]))).toContain('and none with the proposal');
  });

  it('speaks of no direct sun where there is none to lose', () => {
    expect(sentenceOf(dayOf(0, 0))).toBe(
      'On December 21 this yard has no direct sun now, and none with the proposal.',
    );
  });

  it('does not hide what is lost behind a gain', () => {
    const sentence = sentenceOf(dayOf(1, 2, [lateMorning]));
    expect(sentence).toContain('more than before');
    expect(sentence).toMatch(/some is lost between 11:30 a\.m\. and 1:10 p\.m\.$/);
  });

  it('does not hide what is lost behind an equal gain', () => {
    expect(sentenceOf(dayOf(2, 2, [lateMorning]))).toContain('what is lost between 11:30 a.m.');
  });

  it('says where a loss is too thin to have a stretch', () => {
    expect(sentenceOf(dayOf(2, 1.9))).toContain('at no moment');
  });

  it('says that the sun does not rise', () => {
    expect(sentenceOf({ ...dayOf(0, 0), sunriseAt: null })).toBe(
      'On December 21 the sun does not rise here.',
    );
  });

  it('sets the hours strong and nothing else', () => {
    const parts = describeLedgerDay(dayOf(3, 1, [lateMorning]), 'yard', larkhavenFormats);
    expect(
      parts.filter(({ isStrong }) => isStrong).map(({ text }) => withPlainSpaces(text)),
    ).toEqual(['3 h 00 min', '1 h 00 min']);
  });
});
