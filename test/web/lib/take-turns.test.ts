import { describe, expect, it } from 'vitest';
import { createTurns } from '../../../web/lib/take-turns.ts';

describe('createTurns', () => {
  it('runs no more than the places at once, in order, and every task', async () => {
    const takeTurn = createTurns(2);
    const started: number[] = [];
    let running = 0;
    let most = 0;
    const results = await Promise.all(
      [0, 1, 2, 3, 4].map((task) =>
        takeTurn(async () => {
          started.push(task);
          running += 1;
          most = Math.max(most, running);
          await Promise.resolve();
          running -= 1;
          return task * 10;
        }),
      ),
    );
    expect(results).toEqual([0, 10, 20, 30, 40]);
    expect(started).toEqual([0, 1, 2, 3, 4]);
    expect(most).toBe(2);
  });

  it('frees the place of a task that fails', async () => {
    const takeTurn = createTurns(1);
    const failing = takeTurn(() => Promise.reject(new Error('no')));
    const next = takeTurn(() => Promise.resolve('yes'));
    await expect(failing).rejects.toThrow('no');
    await expect(next).resolves.toBe('yes');
  });
});
