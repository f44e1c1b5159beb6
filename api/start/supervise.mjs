import { setTimeout as wait } from 'node:timers/promises';

import { describeEnding } from './children.mjs';

/** @typedef {import('./lifetime.mjs').Lifetime} Lifetime */
/** @typedef {import('./children.mjs').Ending} Ending */

const FIRST_PAUSE_MS = 1_000;
const LONGEST_PAUSE_MS = 30_000;
/** Having run this long, a child is taken to be well again. */
const HEALTHY_AFTER_MS = 60_000;

/**
 * Starts a child and starts it again whenever it ends, after pauses that double; until the lifetime stops.
 *
 * @param {Lifetime} lifetime
 * @param {() => { ended: Promise<Ending> }} start
 * @param {{ report: (text: string) => void, firstPauseMs?: number }} options
 */
export async function keepRunning(lifetime, start, { report, firstPauseMs = FIRST_PAUSE_MS }) {
  let pauseMs = firstPauseMs;
  while (!lifetime.isStopping()) {
    const startedMs = Date.now();
    const ending = await start().ended;
    if (lifetime.isStopping()) return;
    if (Date.now() - startedMs > HEALTHY_AFTER_MS) pauseMs = firstPauseMs;
    report(`ended (${describeEnding(ending)}); starting it again in ${pauseMs / 1000} s`);
    await wait(pauseMs);
    pauseMs = Math.min(pauseMs * 2, LONGEST_PAUSE_MS);
  }
}
