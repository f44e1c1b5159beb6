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
import { Comment } from './modules/comments/comment.entity.ts';
import { MassingRevision } from './modules/massings/massing-revision.entity.ts';
import { Invitation } from './modules/people/invitation.entity.ts';
import { Person } from './modules/people/person.entity.ts';
import { Report } from './modules/reports/report.entity.ts';
import { RuleVersion } from './modules/rules/rule-version.entity.ts';
import { Municipality } from './modules/settings/municipality.entity.ts';
import { StudyInstant } from './modules/studies/study-instant.entity.ts';
import { Study } from './modules/studies/study.entity.ts';

/** Every entity that the database holds. */
export const entities = [
  Building,
  CaseCounter,
  CaseTransition,
  Collector,
  Comment,
  IdempotencyKey,
  Invitation,
  MassingRevision,
  Municipality,
  OpenSpace,
  Parcel,
  Person,
  Report,
  ReviewCase,
  RuleVersion,
  Street,
  StreetLine,
  Study,
  StudyInstant,
  Water,
  Yard,
];
