import { z } from 'zod';
import { defineEndpoint } from '../../endpoint.ts';
import { AppError } from '../../errors.ts';

const healthSchema = z.object({ status: z.literal('ok') });

export const healthEndpoints = [
  defineEndpoint({
    method: 'get',
    path: '/api/health/live',
    summary: 'Tells whether the process answers.',
    access: 'anybody',
    response: healthSchema,
    handler: () => Promise.resolve({ status: 'ok' as const }),
  }),
  defineEndpoint({
    method: 'get',
    path: '/api/health/ready',
    summary: 'Tells whether the database and the job queue are there.',
    access: 'anybody',
    response: healthSchema,
    handler: async ({ deps }) => {
      const isDatabaseThere = await deps.orm.isConnected();
      const isQueueThere = isDatabaseThere && (await deps.queue.isInstalled());
      if (!isQueueThere) throw new AppError('UNAVAILABLE');
      return { status: 'ok' as const };
    },
  }),
];
