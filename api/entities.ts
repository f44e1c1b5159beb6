import { IdempotencyKey } from './middleware/idempotency-key.entity.ts';
import { Building } from './modules/base-data/building.entity.ts';
import { Collector } from './modules/base-data/collector.entity.ts';
import { OpenSpace } from './modules/base-data/open-space.entity.ts';
import { Parcel } from './modules/base-data/parcel.entity.ts';
import { StreetLine } from './modules/base-data/street-line.entity.ts';
import { Street } from './modules/base-data/street.entity.ts';
import { Water } from './modules/base-data/water.entity.ts';
import { Yard } from './modules/base-data/yard.entity.ts';
import { CaseCounter } from './modules/cases/case-counter.entity.ts';
import { CaseTransition } from './modules/cases/case-transition.entity.ts';
import { ReviewCase } from './modules/cases/review-case.entity.ts';
import { Invitation } from './modules/people/invitation.entity.ts';
import { Person } from './modules/people/person.entity.ts';
import { RuleVersion } from './modules/rules/rule-version.entity.ts';
import { Municipality } from './modules/settings/municipality.entity.ts';

/** Every entity that the database holds. */
export const entities = [
  Building,
  CaseCounter,
  CaseTransition,
  Collector,
  IdempotencyKey,
  Invitation,
  Municipality,
  OpenSpace,
  Parcel,
  Person,
  ReviewCase,
  RuleVersion,
  Street,
  StreetLine,
  Water,
  Yard,
];
