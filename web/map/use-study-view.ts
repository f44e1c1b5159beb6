import { useCallback, useEffect, useMemo, useState } from 'react';
import { useSearchParams } from 'react-router-dom';
import { formatInstant } from '../../shared/solar/civil-time.ts';
import { usePlace } from '../lib/place-context.ts';
import {
  clockOf,
  defaultDate,
  listJudgedWindows,
  parseStudyView,
  resolveInstant,
  writeStudyView,
  type StudyDays,
  type StudyView,
} from './study-view.ts';
import { listArcSteps, snapToStep, type ArcSteps } from './sun-arc-steps.ts';
import { computeSunDay } from './sun-day.ts';
import { useSettledValue } from './use-settled-value.ts';

/** Browsers refuse an address that changes many times a second. */
const addressDelayMs = 300;
const askDelayMs = 120;

/** The view of a study: in the address, and while the person drags ahead of it. */
export function useStudyView(study: StudyDays) {
  const { municipality } = usePlace();
  const { longitude, latitude } = municipality;
  const [searchParams, setSearchParams] = useSearchParams();
  const view = useMemo(() => parseStudyView(searchParams), [searchParams]);
  const date = view.date ?? defaultDate(study);

  const day = useMemo(
    () => computeSunDay(date, study.timeZone, longitude, latitude),
    [date, study.timeZone, longitude, latitude],
  );
  const windows = useMemo(() => listJudgedWindows(study, date), [study, date]);
  const steps = useMemo(() => listArcSteps(day, windows[0] ?? null), [day, windows]);

  const change = useCallback(
    (next: Partial<StudyView>) => {
      setSearchParams(
        // The address bar, not the last render: the map may have written its camera meanwhile.
        () => writeStudyView(new URLSearchParams(window.location.search), next),
        { replace: true, preventScrollReset: true },
      );
    },
    [setSearchParams],
  );

  const addressMs = clampToSteps(steps, resolveInstant(study, date, view.time, day.noonMs));
  // Ahead of the address only for the day on which the person moves the handle.
  const [moved, setMoved] = useState<{ date: string; atMs: number } | null>(null);
  const atMs = moved?.date === date ? moved.atMs : addressMs;
  useEffect(() => {
    if (moved === null) return;
    const timer = window.setTimeout(() => {
      change({ date: moved.date, time: clockOf(moved.atMs, study.timeZone) });
      setMoved(null);
    }, addressDelayMs);
    return () => window.clearTimeout(timer);
  }, [moved, change, study.timeZone]);

  const setInstant = useCallback((nextMs: number) => setMoved({ date, atMs: nextMs }), [date]);
  const askedMs = useSettledValue(atMs, askDelayMs);
  return {
    date,
    day,
    windows,
    steps,
    layer: view.layer,
    receptor: view.receptor,
    atMs,
    /** The instant, RFC 3339; null where the sun stays down. */
    at: steps === null ? null : formatInstant(atMs, study.timeZone),
    /** The same once the handle rests. */
    askedAt: steps === null ? null : formatInstant(askedMs, study.timeZone),
    change,
    setInstant,
  };
}

function clampToSteps(steps: ArcSteps | null, atMs: number): number {
  if (steps === null) return atMs;
  return atMs < steps.firstMs || atMs > steps.lastMs ? snapToStep(steps, atMs) : atMs;
}
