import type { RuleVersionState } from '../../../shared/contracts/rules.ts';
import type { DayEvent, MeasureKind } from '../../../shared/rules/rule-schema.ts';

export const versionStateWords = {
  draft: 'draft',
  scheduled: 'in force from its day',
  'in-force': 'in force',
  retired: 'no longer in force',
} as const satisfies Record<RuleVersionState, string>;

/** Measures as one chooses among them. */
export const measureChoices = [
  { id: 'sun-hours', label: 'Hours of sun, mean over the area' },
  { id: 'sun-share', label: 'Share of the area with enough hours of sun' },
  { id: 'sun-area', label: 'Square metres with enough hours of sun' },
  { id: 'best-run', label: 'Longest unbroken time in sun' },
  { id: 'worst-shade-hours', label: 'Hours of shade at the most shaded point' },
  { id: 'shade-share', label: 'Largest share in shade at any instant' },
  { id: 'sun-area-hours', label: 'Sunlit area times hours, over all days' },
  { id: 'beam-energy', label: 'Direct clear-sky energy, over all days' },
] as const satisfies readonly { id: MeasureKind; label: string }[];

export const eventChoices = [
  { id: 'march-equinox', label: 'March equinox' },
  { id: 'june-solstice', label: 'June solstice' },
  { id: 'september-equinox', label: 'September equinox' },
  { id: 'december-solstice', label: 'December solstice' },
  { id: 'winter-solstice', label: 'Winter solstice of the place' },
  { id: 'summer-solstice', label: 'Summer solstice of the place' },
] as const satisfies readonly { id: DayEvent; label: string }[];
