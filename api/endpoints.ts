import type { Endpoint } from './endpoint.ts';
import { healthEndpoints } from './modules/settings/health.routes.ts';

/** Every endpoint of the API: the routes and the API's document are made from this list. */
export const endpoints: readonly Endpoint[] = [...healthEndpoints];
