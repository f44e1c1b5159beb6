import {
  municipalitySchema,
  setUpMunicipalityInputSchema,
} from '../../../shared/contracts/base-data.ts';
import { defineEndpoint } from '../../endpoint.ts';
import { getMunicipality } from './get-municipality.ts';
import { presentMunicipality } from './municipality.presenter.ts';
import { setUpMunicipality } from './set-up-municipality.ts';

export const municipalityEndpoints = [
  defineEndpoint({
    method: 'get',
    path: '/api/municipality',
    summary: 'The place that this server serves.',
    access: 'anybody',
    response: municipalitySchema,
    handler: async ({ em }) => presentMunicipality(await getMunicipality(em)),
  }),
  defineEndpoint({
    method: 'put',
    path: '/api/municipality',
    summary: 'Sets up the place that this server serves, once.',
    access: ['administrator'],
    body: setUpMunicipalityInputSchema,
    status: 201,
    response: municipalitySchema,
    handler: async ({ em, body }) => presentMunicipality(await setUpMunicipality(em, body)),
  }),
];
