import type { EntityManager } from '@mikro-orm/postgresql';
import { ruleSchema } from '../../shared/rules/rule-schema.ts';
import { Building } from '../modules/base-data/building.entity.ts';
import { Collector } from '../modules/base-data/collector.entity.ts';
import { OpenSpace } from '../modules/base-data/open-space.entity.ts';
import { Parcel } from '../modules/base-data/parcel.entity.ts';
import { StreetLine } from '../modules/base-data/street-line.entity.ts';
import { Street } from '../modules/base-data/street.entity.ts';
import { Water } from '../modules/base-data/water.entity.ts';
import { Yard } from '../modules/base-data/yard.entity.ts';
import { createRuleVersion } from '../modules/rules/create-rule-version.ts';
import { civilDateIn } from '../modules/settings/get-municipality.ts';
import { Municipality } from '../modules/settings/municipality.entity.ts';
import type { SampleCity } from './read-sample-data.ts';

/** The municipality's rule: two hours of winter sun around noon, or a loss that hardly counts. */
const demoRule = ruleSchema.parse({
  id: 'solar-access',
  version: 1,
  title: 'Sun kept for neighbours',
  citation: 'Larkhaven Zoning Code 18.42',
  clauses: [
    {
      id: 'winter-noon-hours',
      title: 'Two hours of sun around noon in midwinter',
      receptors: { classes: ['parcel', 'open-space'] },
      days: [{ event: 'winter-solstice' }],
      window: { basis: 'standard', from: '10:00', to: '14:00' },
      step: 10,
      measure: { kind: 'sun-hours' },
      limit: { anyOf: [{ atLeast: 2 }, { losesAtMost: 0.5 }] },
    },
  ],
});

/** The municipality, its base data and its rule, in force since the year began. */
export async function seedCity(em: EntityManager, city: SampleCity, now: Date): Promise<void> {
  const studyYear = Number(civilDateIn(city.municipality, now).slice(0, 4));
  await em.transactional(async (tx) => {
    tx.create(Municipality, { ...city.municipality, studyYear });
    await tx.insertMany(Parcel, city.parcels);
    await tx.insertMany(Building, city.buildings);
    await tx.insertMany(Yard, city.yards);
    await tx.insertMany(OpenSpace, city.openSpaces);
    await tx.insertMany(Collector, city.collectors);
    for (const street of city.streets) tx.create(Street, street);
    for (const line of city.streetLines) tx.create(StreetLine, line);
    for (const water of city.waters) tx.create(Water, water);
    const inForceFrom = `${studyYear}-01-01`;
    await createRuleVersion(tx, null, { rule: demoRule, inForceFrom }, inForceFrom);
  });
}
