import type { IssuePlace } from './issue-severities.ts';
import { cleanText, cutText } from './plain-text.ts';

/** How issues speak of a block: `feature` as the contract names it, `text` to begin a sentence with. */
export interface BlockLabel {
  feature: string;
  /** `Block p1 (North tower)` or `Feature 3`. */
  text: string;
}

export function labelBlock({ id, name }: { id: string; name: string | null }): BlockLabel {
  const [shortId, shortName] = [shorten(id), shorten(name ?? id)];
  return {
    feature: shortId,
    text: shortName === shortId ? `Block ${shortId}` : `Block ${shortId} (${shortName})`,
  };
}

/** For a feature of a file that may have neither id nor name. @param number Its place, counted from 1. */
export function labelFeature(id: string | null, name: string | null, number: number): BlockLabel {
  if (id !== null) return labelBlock({ id, name });
  if (name !== null) return labelBlock({ id: name, name });
  return { feature: `feature ${number}`, text: `Feature ${number}` };
}

export function placeAt(label: BlockLabel, lngLat: [number, number] | null): IssuePlace {
  return { feature: label.feature, lngLat };
}

/** An id or a name may hold anything at any length; a sentence must stay one. */
function shorten(text: string): string {
  const clean = cleanText(text);
  return clean.length > 100 ? `${cutText(clean, 97)}…` : clean;
}
