import { useCallback, useState } from 'react';
import { z } from 'zod';

const draftSchema = z.object({ narrative: z.string(), recommendation: z.string() });
export type ReportDraft = z.infer<typeof draftSchema>;

const emptyDraft: ReportDraft = { narrative: '', recommendation: '' };

/** What the planner has written of a report so far; kept in this browser until it is issued. */
export function useReportDraft(reference: string): {
  draft: ReportDraft;
  change: (draft: ReportDraft) => void;
  clear: () => void;
} {
  const key = `report-draft ${reference}`;
  const [draft, setDraft] = useState(() => readDraft(window.localStorage.getItem(key)));
  const change = useCallback(
    (next: ReportDraft) => {
      setDraft(next);
      window.localStorage.setItem(key, JSON.stringify(next));
    },
    [key],
  );
  const clear = useCallback(() => {
    setDraft(emptyDraft);
    window.localStorage.removeItem(key);
  }, [key]);
  return { draft, change, clear };
}

/** A stored text as a draft; an empty one where it holds none. */
export function readDraft(text: string | null): ReportDraft {
  if (text === null) return emptyDraft;
  try {
    return draftSchema.safeParse(JSON.parse(text)).data ?? emptyDraft;
  } catch {
    return emptyDraft;
  }
}
