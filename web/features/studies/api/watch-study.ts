import { useQueryClient } from '@tanstack/react-query';
import { useEffect, useState } from 'react';
import type { StudyStatus } from '../../../../shared/contracts/cases.ts';
import { studyProgressSchema, type StudyProgress } from '../../../../shared/contracts/studies.ts';

export function isUnderWay(status: StudyStatus): boolean {
  return status === 'queued' || status === 'running';
}

/** A dropped stream is opened again by the browser; where it stays closed, the study is asked for this often. */
const askAgainMs = 5000;

/** Follows a study that is under way, by the server's events; null before the first one. */
export function useStudyProgress(studyId: string): StudyProgress | null {
  const client = useQueryClient();
  const [progress, setProgress] = useState<StudyProgress | null>(null);
  useEffect(() => {
    const refresh = () => {
      void client.invalidateQueries({ queryKey: ['studies', studyId] });
      void client.invalidateQueries({ queryKey: ['cases'] });
    };
    const stream = new EventSource(`/api/studies/${studyId}/events`);
    stream.addEventListener('progress', (event: MessageEvent<string>) => {
      const parsed = studyProgressSchema.safeParse(JSON.parse(event.data));
      if (!parsed.success) return;
      setProgress(parsed.data);
      if (!isUnderWay(parsed.data.status)) {
        stream.close();
        refresh();
      }
    });
    const timer = window.setInterval(() => {
      if (stream.readyState === EventSource.CLOSED) refresh();
    }, askAgainMs);
    return () => {
      stream.close();
      window.clearInterval(timer);
    };
  }, [client, studyId]);
  return progress;
}
