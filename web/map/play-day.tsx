import { useEffect, useEffectEvent, useState } from 'react';
import { Button } from '../components/button.tsx';
import { useReducedMotion } from '../lib/use-reduced-motion.ts';
import { moveByKey, type ArcSteps } from './sun-arc-steps.ts';

export interface PlayDayProps {
  steps: ArcSteps;
  atMs: number;
  /** The shadows of this instant are on the map; the next step waits for them. */
  isDrawn: boolean;
  onChange: (atMs: number) => void;
}

const stepEveryMs = 140;

/** Moves the sun through the day, step by step. Absent where the person wants nothing to move. */
export function PlayDay({ steps, atMs, isDrawn, onChange }: PlayDayProps) {
  const wantsStillness = useReducedMotion();
  const [isWanted, setIsWanted] = useState(false);
  const isPlaying = isWanted && !wantsStillness;
  const goOn = useEffectEvent(() => {
    if (!isDrawn) return;
    const nextMs = moveByKey(steps, atMs, 'ArrowRight') ?? atMs;
    if (nextMs > atMs) onChange(nextMs);
    else setIsWanted(false);
  });
  useEffect(() => {
    if (!isPlaying) return;
    const timer = window.setInterval(() => goOn(), stepEveryMs);
    return () => window.clearInterval(timer);
  }, [isPlaying]);
  if (wantsStillness) return null;
  return (
    <div className="no-print">
      <Button
        onPress={() => {
          if (!isPlaying && atMs >= steps.lastMs) onChange(steps.firstMs);
          setIsWanted(!isPlaying);
        }}
      >
        {isPlaying ? 'Stop' : 'Play through the day'}
      </Button>
    </div>
  );
}
