import type { z } from 'zod';
import type {
  setUpMunicipalityInputSchema,
  SetUpMunicipalityInput,
} from '../../../shared/contracts/base-data.ts';

/** What a person wrote into the form, field by field. */
export type PlaceTexts = Partial<
  Record<
    | 'name'
    | 'shortName'
    | 'timeZone'
    | 'locale'
    | 'latitude'
    | 'longitude'
    | 'elevationM'
    | 'west'
    | 'south'
    | 'east'
    | 'north'
    | 'studyYear',
    string
  >
>;

const extentSides = ['west', 'south', 'east', 'north'] as const;

/** The texts as the API wants them, or what is wrong with which field. */
export function readPlace(
  texts: PlaceTexts,
  schema: typeof setUpMunicipalityInputSchema,
): {
  input: SetUpMunicipalityInput | null;
  problems: Partial<Record<keyof PlaceTexts, string>>;
} {
  const numberOf = (name: keyof PlaceTexts) => {
    const text = texts[name]?.trim() ?? '';
    return text === '' ? NaN : Number(text);
  };
  const parsed = schema.safeParse({
    name: texts.name ?? '',
    shortName: texts.shortName ?? '',
    timeZone: texts.timeZone ?? '',
    locale: texts.locale ?? '',
    longitude: numberOf('longitude'),
    latitude: numberOf('latitude'),
    elevationM: numberOf('elevationM'),
    extent: extentSides.map(numberOf),
    studyYear: numberOf('studyYear'),
  });
  if (parsed.success) return { input: parsed.data, problems: {} };
  return {
    input: null,
    problems: Object.fromEntries(
      parsed.error.issues.map((issue) => [fieldOf(issue), issue.message]),
    ),
  };
}

function fieldOf({ path }: z.core.$ZodIssue): keyof PlaceTexts {
  const [name, side] = path;
  if (name === 'extent') return extentSides[typeof side === 'number' ? side : 0] ?? 'west';
  return fieldNames.find((one) => one === name) ?? 'name';
}

const fieldNames: readonly (keyof PlaceTexts)[] = [
  'name',
  'shortName',
  'timeZone',
  'locale',
  'latitude',
  'longitude',
  'elevationM',
  'studyYear',
];
