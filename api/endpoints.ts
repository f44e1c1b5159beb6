import packageJson from '../package.json' with { type: 'json' };
import type { Endpoint } from './endpoint.ts';
import { describeEndpoints } from './modules/api-document/api-document.routes.ts';
import { baseDataEndpoints } from './modules/base-data/base-data.routes.ts';
import { casesEndpoints } from './modules/cases/cases.routes.ts';
import { commentEndpoints } from './modules/comments/comment.routes.ts';
import { massingEndpoints } from './modules/massings/massing.routes.ts';
import { peopleEndpoints } from './modules/people/people.routes.ts';
import { reportEndpoints } from './modules/reports/report.routes.ts';
import { rulesEndpoints } from './modules/rules/rules.routes.ts';
import { healthEndpoints } from './modules/settings/health.routes.ts';
import { municipalityEndpoints } from './modules/settings/municipality.routes.ts';
import { studyEndpoints } from './modules/studies/study.routes.ts';

const workingEndpoints: readonly Endpoint[] = [
  ...healthEndpoints,
  ...peopleEndpoints,
  ...municipalityEndpoints,
  ...baseDataEndpoints,
  ...rulesEndpoints,
  ...casesEndpoints,
  ...massingEndpoints,
  ...studyEndpoints,
  ...commentEndpoints,
  ...reportEndpoints,
];

/** Every endpoint of the API: the routes and the API's document are made from this list. */
export const endpoints: readonly Endpoint[] = [
  ...workingEndpoints,
  ...describeEndpoints(workingEndpoints, packageJson.version),
];
