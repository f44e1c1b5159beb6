import { setTimeout as wait } from 'node:timers/promises';

import { describeEnding } from './children.mjs';
import { Problem } from './problem.mjs';

const READY_WITHIN_MS = 90_000;

/**
 * Waits until the server says that it, its database and its queue are ready.
 *
 * @param {string} url of the application
 * @param {import('./children.mjs').Child} server
 * @param {number} withinMs
 */
export async function waitUntilReady(url, server, withinMs = READY_WITHIN_MS) {
  const deadlineMs = Date.now() + withinMs;
  let answer = 'no answer yet';
  while (Date.now() < deadlineMs) {
    answer = await askHealth(url);
    if (answer === 'ready') return;
    const ending = await Promise.race([server.ended, wait(150, null)]);
    if (ending) {
      throw new Problem(`The server ended while starting (${describeEnding(ending)}); see above.`);
    }
  }
  throw new Problem(`The server has not become ready within ${withinMs / 1000} s: ${answer}.`);
}

/**
 * @param {string} url
 * @returns {Promise<string>} `ready`, or why not
 */
async function askHealth(url) {
  try {
    const response = await fetch(`${url}/api/health/ready`, { signal: AbortSignal.timeout(5_000) });
    const body = await response.text();
    return response.ok ? 'ready' : `it answers ${response.status} ${body.slice(0, 300)}`;
  } catch (error) {
    return error instanceof Error && error.cause instanceof Error
      ? error.cause.message
      : String(error);
  }
}
