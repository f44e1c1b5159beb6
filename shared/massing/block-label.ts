import type { IssuePlace } from './issue-severities.ts';

/** How issues speak of a block: `feature` as the contract names it, `text` to begin a sentence with. */
export interface BlockLabel {
  feature: string;
  /** `Block p1 (North tower)` or `Feature 3`. */
  text: string;
}

export function labelBlock({ id, name }: { id: string; name: string | null }): BlockLabel {
  return {
    feature: id,
    text: name === null || name === id ? `Block ${id}` : `Block ${id} (${name})`,
  };
}

/** For a feature of a file that may have neither id nor name. @param number Its place, counted from 1. */
export function labelFeature(id: string | null, name: string | null, number: number): BlockLabel {
  if (id !== null) return labelBlock({ id, name });
  if (name !== null) return { feature: name, text: `Block ${name}` };
  return { feature: `feature ${number}`, text: `Feature ${number}` };
}

export function placeAt(label: BlockLabel, lngLat: [number, number] | null): IssuePlace {
  return { feature: label.feature, lngLat };
}
