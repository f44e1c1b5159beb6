import { setTimeout as wait } from 'node:timers/promises';
import { describe, expect, it } from 'vitest';
import { Lifetime, Stopped } from '../../../api/start/lifetime.mjs';

describe('Lifetime', () => {
  it('gives back what was taken last first, each before the next', async () => {
    const lifetime = new Lifetime();
    const events: string[] = [];
    for (const name of ['lock', 'database', 'worker', 'server']) {
      lifetime.hold(async () => {
        events.push(`${name} stopping`);
        await wait(5);
        events.push(`${name} stopped`);
      });
    }
    await Promise.all([lifetime.stop(), lifetime.stop()]);
    expect(events).toEqual([
      'server stopping',
      'server stopped',
      'worker stopping',
      'worker stopped',
      'database stopping',
      'database stopped',
      'lock stopping',
      'lock stopped',
    ]);
  });

  it('goes on when one release fails', async () => {
    const lifetime = new Lifetime();
    const events: string[] = [];
    lifetime.hold(() => void events.push('lock'));
    lifetime.hold(() => Promise.reject(new Error('a failure that this test makes on purpose')));
    await lifetime.stop();
    expect(events).toEqual(['lock']);
  });

  it('forgets what has ended by itself', async () => {
    const lifetime = new Lifetime();
    const events: string[] = [];
    const forget = lifetime.hold(() => void events.push('released'));
    forget();
    await lifetime.stop();
    expect(events).toEqual([]);
  });

  it('lets nothing new begin once it stops', async () => {
    const lifetime = new Lifetime();
    lifetime.checkpoint();
    await lifetime.stop();
    expect(() => lifetime.checkpoint()).toThrow(Stopped);
  });
});
