import type { DrawnEvidence } from './api/get-study-evidence.ts';

export interface ReceptorName {
  id: string;
  class: string;
  label: string;
}

/** What one would rather read about first: the place where people sit. */
const classOrder = ['yard', 'open-space', 'walk', 'parcel', 'collector'];

/**
 * The receptors at one address: a parcel, its yard (`Rear yard, 12 Tallowreed Row`), its collectors.
 * Empty where the study does not know the receptor.
 */
export function receptorsAtSameAddress(
  evidence: Pick<DrawnEvidence, 'receptors'>,
  receptor: string,
): ReceptorName[] {
  const names = evidence.receptors.features.map(({ properties }) => properties);
  const chosen = names.find(({ id }) => id === receptor);
  if (chosen === undefined) return [];
  const address = addressOf(chosen.label);
  return names
    .filter(({ label }) => addressOf(label) === address)
    .toSorted((a, b) => classOrder.indexOf(a.class) - classOrder.indexOf(b.class));
}

/** `12 Tallowreed Row` of `Rear yard, 12 Tallowreed Row`. */
function addressOf(label: string): string {
  return label.split(', ').at(-1) ?? label;
}
