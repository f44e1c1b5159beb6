import { useState } from 'react';
import { NoonMark } from '../../../components/noon-mark.tsx';
import { usePlace } from '../../../lib/place-context.ts';
import { noonAltitudeDeg } from '../noon-altitude.ts';

/** The mark, redrawn for this place and today. */
export function PlaceMark() {
  const { longitude, latitude } = usePlace().municipality;
  const [nowMs] = useState(() => Date.now());
  return <NoonMark noonAltitudeDeg={noonAltitudeDeg(nowMs, longitude, latitude)} />;
}
