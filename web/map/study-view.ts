import { civilClockToMs, civilDateOf } from '../../shared/solar/civil-time.ts';
import { shadowLayers, type ShadowLayer } from './case-layers.ts';

/** What of a study is looked at; it stands in the address, so that a colleague sees the same. */
export interface StudyView {
  /** `YYYY-MM-DD` and `HH:MM` of the municipality's clock; null means the study's own default. */
  date: string | null;
  time: string | null;
  layer: ShadowLayer;
  receptor: string | null;
}

const defaultLayer: ShadowLayer = 'after';

/** The view that an address asks for; what it holds that is no date, time or layer is left out. */
export function parseStudyView(search: URLSearchParams): StudyView {
  const date = search.get('date');
  const time = search.get('time');
  const layer = search.get('layer');
  return {
    date: date !== null && isDate(date) ? date : null,
    time: time !== null && /^(?:[01]\d|2[0-3]):[0-5]\d$/.test(time) ? time : null,
    layer: shadowLayers.find((one) => one === layer) ?? defaultLayer,
    receptor: search.get('receptor'),
  };
}

/** The address with a changed view; everything else in it stays. */
export function writeStudyView(
  search: URLSearchParams,
  change: Partial<StudyView>,
): URLSearchParams {
  const next = new URLSearchParams(search);
  const view = { ...parseStudyView(search), ...change };
  const values = { ...view, layer: view.layer === defaultLayer ? null : view.layer };
  for (const [name, value] of Object.entries(values)) {
    if (value === null || value === '') next.delete(name);
    else next.set(name, value);
  }
  return next;
}

/** What a study says about its days; see `StudyDetail`. */
export interface StudyDays {
  timeZone: string;
  keyDates: readonly { event: string; date: string }[];
  rule: {
    clauses: readonly {
      title: string;
      days: readonly { date: string; fromAt: string; toAt: string }[];
    }[];
  };
}

export interface JudgedWindow {
  title: string;
  fromMs: number;
  toMs: number;
}

/** The windows in which the rule judges on a date; several clauses may share one. */
export function listJudgedWindows(study: StudyDays, date: string): JudgedWindow[] {
  const windows = new Map<string, JudgedWindow>();
  for (const clause of study.rule.clauses) {
    for (const day of clause.days.filter((one) => one.date === date)) {
      const key = `${day.fromAt}/${day.toAt}`;
      if (windows.has(key)) continue;
      windows.set(key, {
        title: clause.title,
        fromMs: Date.parse(day.fromAt),
        toMs: Date.parse(day.toAt),
      });
    }
  }
  return [...windows.values()];
}

/** The date to begin with: a judged one, best a key date; else the last key date of the year. */
export function defaultDate(study: StudyDays): string {
  const judged = study.rule.clauses.flatMap((clause) => clause.days.map((day) => day.date));
  const keyDates = study.keyDates.map((one) => one.date);
  const date = keyDates.findLast((one) => judged.includes(one)) ?? judged[0] ?? keyDates.at(-1);
  if (date === undefined) throw new RangeError('A study without key dates has no day to show.');
  return date;
}

/** The instant that a date and a clock time mean; in the middle of the judged hours without a time. */
export function resolveInstant(
  study: StudyDays,
  date: string,
  time: string | null,
  noonMs: number,
): number {
  if (time !== null) return civilClockToMs(date, time, study.timeZone, 'first');
  const [window] = listJudgedWindows(study, date);
  return window === undefined ? noonMs : (window.fromMs + window.toMs) / 2;
}

/** `HH:MM` of an instant on the municipality's clock, for the address. */
export function clockOf(atMs: number, timeZone: string): string {
  return new Intl.DateTimeFormat('en-GB', {
    timeZone,
    hour: '2-digit',
    minute: '2-digit',
    hourCycle: 'h23',
  }).format(atMs);
}

function isDate(text: string): boolean {
  if (!/^\d{4}-\d{2}-\d{2}$/.test(text)) return false;
  const atMs = Date.parse(`${text}T00:00:00Z`);
  return !Number.isNaN(atMs) && civilDateOf(atMs, 'UTC') === text;
}
