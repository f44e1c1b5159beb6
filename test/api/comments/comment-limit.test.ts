import { expect, it } from 'vitest';
import { limits } from '../../../api/middleware/rate-limits.ts';
import { bodyOf, startTestApi } from '../../support/test-api.ts';

it('takes only so many comments from one address', async () => {
  const api = await startTestApi();
  try {
    const neighbour = await api.signIn('public');
    const send = () => neighbour.post('/api/cases/2026-0001/comments').send({});
    for (let sent = 0; sent < limits.comment.limit; sent += 1) await send().expect(422);
    expect(await bodyOf(send().expect(429))).toMatchObject({ code: 'RATE_LIMITED' });
  } finally {
    await api.close();
  }
});
