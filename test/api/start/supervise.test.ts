import { describe, expect, it } from 'vitest';
import { Lifetime } from '../../../api/start/lifetime.mjs';
import { keepRunning } from '../../../api/start/supervise.mjs';

describe('keepRunning', () => {
  it('starts a child again after pauses that double, until the program stops', async () => {
    const lifetime = new Lifetime();
    const reports: string[] = [];
    let starts = 0;
    await keepRunning(
      lifetime,
      () => {
        starts += 1;
        if (starts === 4) void lifetime.stop();
        return { ended: Promise.resolve({ code: 1, signal: null }) };
      },
      { report: (text) => reports.push(text), firstPauseMs: 1 },
    );
    expect(starts).toBe(4);
    expect(reports).toEqual([
      'ended (exit code 1); starting it again in 0.001 s',
      'ended (exit code 1); starting it again in 0.002 s',
      'ended (exit code 1); starting it again in 0.004 s',
    ]);
  });
});
