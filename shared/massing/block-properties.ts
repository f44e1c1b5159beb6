import { placeAt, type BlockLabel } from './block-label.ts';
import { createIssue, type IssueCode } from './issue-severities.ts';
import type { MassingBlock, MassingRole } from './massing-block.ts';
import type { MassingIssue } from './massing-issue.ts';
import { showValue } from './plain-text.ts';

/** The names under which each property is found, in lower case without `_`, `-` and spaces. */
const propertyNames = {
  base: ['base', 'basem', 'minheight', 'minheightm'],
  top: ['top', 'topm', 'height', 'heightm'],
  storeys: ['storeys', 'stories', 'levels', 'floors'],
} as const;

/** What people write for the two roles, in lower case. */
const roleNames: Record<string, MassingRole> = {
  proposed: 'proposed',
  proposal: 'proposed',
  new: 'proposed',
  existing: 'existing',
  demolish: 'existing',
  demolished: 'existing',
  demolition: 'existing',
  remove: 'existing',
  removed: 'existing',
};

/** No building has more. */
const mostStoreys = 300;

export interface ReadProperties {
  /** Null when base, top or role could not be read; the issues then say what. */
  properties: Pick<MassingBlock, 'role' | 'baseM' | 'topM' | 'storeys'> | null;
  issues: MassingIssue[];
}

/**
 * Reads role, heights and storeys from a feature's properties, whatever format they came from. Nothing is guessed:
 * no top from storeys, no metres from feet. A missing base is the ground, 0, and is said.
 */
export function readBlockProperties(
  record: Record<string, unknown>,
  label: BlockLabel,
  lngLat: [number, number] | null,
): ReadProperties {
  const issues: MassingIssue[] = [];
  const say = (code: IssueCode, message: string, suggestion = '') =>
    issues.push(createIssue(code, placeAt(label, lngLat), message, suggestion));

  const found = {
    base: listEntries(record, propertyNames.base),
    top: listEntries(record, propertyNames.top),
    storeys: listEntries(record, propertyNames.storeys),
  };

  const role = readRole(record, say, label);
  const baseM = found.base.length === 0 ? 0 : readNumber(found.base, say, label);
  const topM = found.top.length === 0 ? null : readNumber(found.top, say, label);
  if (found.top.length === 0) {
    say('MASSING_TOP_MISSING', ...describeMissingTop(record, found.storeys, label));
  }
  if (role === null || baseM === null || topM === null) return { properties: null, issues };

  if (found.base.length === 0) {
    say(
      'MASSING_BASE_MISSING',
      `${label.text} has no base height; 0 m, the ground, was taken.`,
      'Give base in metres where the block stands on another one or hangs over the ground.',
    );
  }
  const [topEntry] = found.top;
  if (
    baseM !== 0 &&
    topEntry !== undefined &&
    found.top.every(({ name }) => /height/i.test(name))
  ) {
    say(
      'MASSING_HEIGHT_READ_AS_TOP',
      `${label.text}: ${topEntry.name} ${topM} was read as the height of the top above the ground, not above the base of ${baseM} m.`,
      'Send top instead, in metres above the ground, if that is not what is meant.',
    );
  }
  const storeys = readStoreys(found.storeys, say, label);
  return { properties: { role, baseM, topM, storeys }, issues };
}

type Say = (code: IssueCode, message: string, suggestion?: string) => void;

interface Entry {
  /** As it stands in the file. */
  name: string;
  value: unknown;
}

/** The properties with one of these names that have a value at all. */
function listEntries(record: Record<string, unknown>, names: readonly string[]): Entry[] {
  return Object.entries(record)
    .filter(([name, value]) => names.includes(plainName(name)) && !isBlank(value))
    .map(([name, value]) => ({ name, value }));
}

function plainName(name: string): string {
  return name.toLowerCase().replaceAll(/[\s_-]/g, '');
}

function isBlank(value: unknown): boolean {
  return (
    value === undefined || value === null || (typeof value === 'string' && value.trim() === '')
  );
}

function readRole(
  record: Record<string, unknown>,
  say: Say,
  label: BlockLabel,
): MassingRole | null {
  const [entry] = listEntries(record, ['role']);
  if (entry === undefined) return 'proposed';
  const text = typeof entry.value === 'string' ? entry.value.trim().toLowerCase() : '';
  const role = Object.hasOwn(roleNames, text) ? roleNames[text] : undefined;
  if (role !== undefined) return role;
  say(
    'MASSING_ROLE_UNKNOWN',
    `${label.text} has the role ${showValue(entry.value)}, which is not known.`,
    'Write "proposed" for what comes, "existing" for what stands on the site and is removed.',
  );
  return null;
}

/** One number from all entries that mean the same; null after saying why not. */
function readNumber(entries: readonly Entry[], say: Say, label: BlockLabel): number | null {
  const numbers: number[] = [];
  for (const { name, value } of entries) {
    const number = toNumber(value);
    if (number === null) {
      say(
        'MASSING_NUMBER_INVALID',
        `${label.text} has the ${name} ${showValue(value)}, which is no number.`,
        `Give ${name} as a plain number of metres, for example 12.5.`,
      );
      return null;
    }
    if (typeof value === 'string') sayNumberAsText({ name, value }, number, say, label);
    numbers.push(number);
  }
  const [first] = numbers;
  if (first !== undefined && numbers.every((number) => number === first)) return first;
  say(
    'MASSING_PROPERTIES_DISAGREE',
    `${label.text} gives the same height in different ways: ${entries.map(({ name, value }) => `${name} ${showValue(value)}`).join(', ')}.`,
    'Keep base and top alone, in metres above the ground.',
  );
  return null;
}

/** A finite number, or one written out as text with a decimal point; −0 is 0. */
function toNumber(value: unknown): number | null {
  if (typeof value === 'number') return Number.isFinite(value) ? value + 0 : null;
  if (typeof value !== 'string' || !/^[+-]?\d+(\.\d+)?$/.test(value.trim())) return null;
  const number = Number(value);
  return Number.isFinite(number) ? number + 0 : null;
}

function sayNumberAsText({ name, value }: Entry, number: number, say: Say, label: BlockLabel) {
  say(
    'MASSING_NUMBER_AS_TEXT',
    `${label.text}: the text ${showValue(value)} in ${name} was read as the number ${number}.`,
  );
}

function readStoreys(entries: readonly Entry[], say: Say, label: BlockLabel): number | null {
  const [entry] = entries;
  if (entry === undefined) return null;
  const number = toNumber(entry.value);
  if (number !== null && Number.isInteger(number) && number >= 1 && number <= mostStoreys) {
    if (typeof entry.value === 'string') sayNumberAsText(entry, number, say, label);
    return number;
  }
  say(
    'MASSING_STOREYS_NOT_READ',
    `${label.text} has the ${entry.name} ${showValue(entry.value)}, which is no whole number of storeys; it was left out.`,
    'Give storeys as a whole number, or leave it out.',
  );
  return null;
}

/** The sentence and the way out for a block without a top. */
function describeMissingTop(
  record: Record<string, unknown>,
  storeys: readonly Entry[],
  label: BlockLabel,
): [message: string, suggestion: string] {
  const feet = Object.keys(record).find((name) => /(ft|feet)$/.test(plainName(name)));
  if (feet !== undefined) {
    return [
      `${label.text} has no top height in metres; ${showValue(feet)} is not read.`,
      'Convert the heights to metres (1 ft is 0.3048 m) and give them as base and top.',
    ];
  }
  if (storeys.length > 0) {
    return [
      `${label.text} has ${storeys[0]?.name ?? 'storeys'} but no top height; a height is not guessed from storeys.`,
      'Add top, the height of the roof or parapet above the ground in metres.',
    ];
  }
  return [
    `${label.text} has no top height.`,
    'Add top, the height of the roof or parapet above the ground in metres.',
  ];
}
