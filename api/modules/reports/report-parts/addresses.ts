/** By street, then by house number: `9 Oarlock Shore` before `12 Oarlock Shore`, both before `2 Saltpan Quay`. */
export function compareAddresses(locale: string): (a: string, b: string) => number {
  const collator = new Intl.Collator(locale, { numeric: true });
  return (a, b) => {
    const [first, second] = [splitAddress(a), splitAddress(b)];
    return (
      collator.compare(first.street, second.street) ||
      collator.compare(first.house, second.house) ||
      collator.compare(a, b)
    );
  };
}

/** Sorted labels in their shortest form, street by street: `Oarlock Shore 5, 7; Tallowreed Row 1`. */
export function sayByStreet(labels: readonly string[]): string {
  const streets = new Map<string, string[]>();
  for (const label of labels) {
    const { before, house, street } = splitAddress(label);
    const place = `${before}${street}`;
    streets.set(place, [...(streets.get(place) ?? []), ...(house === '' ? [] : [house])]);
  }
  return [...streets.entries()]
    .map(([place, houses]) => `${place} ${houses.join(', ')}`.trim())
    .join('; ');
}

/** `Rear yard, 9 Oarlock Shore` as what stands before the address, house and street; a label without a house is all street. */
function splitAddress(label: string): { before: string; house: string; street: string } {
  const parts = /^(.*?,\s*)?(\d+\S*)\s+(.+)$/.exec(label);
  return { before: parts?.[1] ?? '', house: parts?.[2] ?? '', street: parts?.[3] ?? label };
}
