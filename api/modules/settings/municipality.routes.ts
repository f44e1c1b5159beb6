import { municipalitySchema } from '../../../shared/contracts/base-data.ts';
import { defineEndpoint } from '../../endpoint.ts';
import { getMunicipality } from './get-municipality.ts';
import { presentMunicipality } from './municipality.presenter.ts';

export const municipalityEndpoints = [
  defineEndpoint({
    method: 'get',
    path: '/api/municipality',
    summary: 'The place that this server serves.',
    access: 'anybody',
    response: municipalitySchema,
    handler: async ({ em }) => presentMunicipality(await getMunicipality(em)),
  }),
];
