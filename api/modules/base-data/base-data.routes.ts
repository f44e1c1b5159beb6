import { z } from 'zod';
import {
  listParcelsQuerySchema,
  parcelPageSchema,
  tileLayerSchema,
} from '../../../shared/contracts/base-data.ts';
import { defineEndpoint, defineRawEndpoint } from '../../endpoint.ts';
import { listParcels } from './list-parcels.ts';
import { renderTile } from './spatial-queries.ts';

const deepestZoom = 22;

const tileParams = z
  .object({
    layer: tileLayerSchema,
    z: z.coerce.number().int().min(0).max(deepestZoom),
    x: z.coerce.number().int().min(0),
    y: z.coerce.number().int().min(0),
  })
  .refine(({ z: zoom, x, y }) => Math.max(x, y) < 2 ** zoom);

export const baseDataEndpoints = [
  defineEndpoint({
    method: 'get',
    path: '/api/parcels',
    summary: 'Finds parcels by number, address or point.',
    access: 'anybody',
    query: listParcelsQuerySchema,
    response: parcelPageSchema,
    handler: ({ em, query }) => listParcels(em, query),
  }),
  defineRawEndpoint({
    method: 'get',
    path: '/api/tiles/:layer/:z/:x/:y.mvt',
    summary: 'One layer of the base map in one vector tile.',
    access: 'anybody',
    params: tileParams,
    produces: 'application/vnd.mapbox-vector-tile',
    handler: async ({ em, params: { layer, ...place }, response }) => {
      const tile = await renderTile(em, layer, place);
      // The same for everybody; the entity tag that Express adds tells when the base data has changed.
      response
        .type('application/vnd.mapbox-vector-tile')
        .set('Cache-Control', 'public, max-age=600')
        .send(tile);
    },
  }),
];
