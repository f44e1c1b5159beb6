const words: Partial<Record<string, string>> = {
  parcel: 'parcel',
  yard: 'yard',
  'open-space': 'open space',
  collector: 'roof collector',
  walk: 'walk',
  window: 'window',
  ring: 'ground around the site',
};

/** What a class of receptor is called in a table. */
export function wordOfClass(receptorClass: string): string {
  return words[receptorClass] ?? receptorClass;
}
