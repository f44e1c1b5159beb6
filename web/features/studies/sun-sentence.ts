import type { LedgerDay } from '../../../shared/receptors/sun-ledger-schema.ts';
import type { Formats } from '../../lib/formats.ts';

/** A piece of a sentence; figures are set strong. */
export interface SentencePart {
  text: string;
  isStrong?: boolean;
}

const subjects: Partial<Record<string, string>> = {
  parcel: 'this parcel',
  yard: 'this yard',
  'open-space': 'this open space',
  collector: 'this solar collector',
  walk: 'this walk',
  window: 'this window',
};

/** What a receptor of a class is called in a sentence about itself. */
export function subjectOfClass(receptorClass: string): string {
  return subjects[receptorClass] ?? 'this place';
}

const plain = (text: string): SentencePart => ({ text });
const strong = (text: string): SentencePart => ({ text, isStrong: true });

/**
 * What one day brings to a receptor, as a sentence: the sun it has now, the sun with the proposal,
 * and from when to when it is lost. Hours are means over the open area; a stretch counts as lost
 * where at least a twentieth of the area loses the sun.
 */
export function describeLedgerDay(
  day: Pick<LedgerDay, 'date' | 'sunHours' | 'lostSpans' | 'sunriseAt' | 'samples'>,
  receptorClass: string,
  formats: Pick<Formats, 'dayOfYear' | 'hours' | 'clock'>,
): SentencePart[] {
  const on = `On ${formats.dayOfYear(day.date)} `;
  const subject = subjectOfClass(receptorClass);
  const isSunUp = day.sunriseAt !== null || day.samples.length > 0;
  if (!isSunUp) return [plain(`${on}the sun does not rise here.`)];

  const before = minutesOf(day.sunHours.before);
  const after = minutesOf(day.sunHours.after);
  if (before === 0 && after === 0) {
    return [plain(`${on}${subject} has no direct sun now, and none with the proposal.`)];
  }
  const has: SentencePart[] = [
    plain(`${on}${subject} has `),
    ...(before === 0
      ? [plain('no direct sun now')]
      : [strong(formats.hours(day.sunHours.before)), plain(' of sun now')]),
  ];
  if (before === after) {
    return [
      ...has,
      plain(
        day.lostSpans.length === 0
          ? ', and keeps all of it with the proposal.'
          : `, and as much with the proposal: what is lost ${lostBetween(day.lostSpans, formats)} is gained at other times.`,
      ),
    ];
  }
  if (after > before) {
    return [
      ...has,
      plain(', and '),
      strong(formats.hours(day.sunHours.after)),
      plain(
        day.lostSpans.length === 0
          ? ' with the proposal: more than before.'
          : endSentence(
              ` with the proposal: more than before, though some is lost ${lostBetween(day.lostSpans, formats)}`,
            ),
      ),
    ];
  }
  return [
    ...has,
    plain(', and '),
    ...(after === 0 ? [strong('none')] : [strong(formats.hours(day.sunHours.after))]),
    plain(' with the proposal; '),
    plain(
      day.lostSpans.length === 0
        ? 'at no moment does as much as a twentieth of it lose the sun.'
        : endSentence(`it is lost ${lostBetween(day.lostSpans, formats)}`),
    ),
  ];
}

/** `between 11:30 a.m. and 1:10 p.m., and between 3:00 p.m. and 3:25 p.m.` */
export function lostBetween(
  spans: LedgerDay['lostSpans'],
  formats: Pick<Formats, 'clock'>,
): string {
  return spans
    .map(({ fromAt, toAt }) => `between ${formats.clock(fromAt)} and ${formats.clock(toAt)}`)
    .join(', and ');
}

function minutesOf(hours: number): number {
  return Math.round(hours * 60);
}

/** A full stop, unless the last word brings its own: `1:23 p.m.` */
function endSentence(text: string): string {
  return text.endsWith('.') ? text : `${text}.`;
}
