import { openDataFolder } from './data-folder.mjs';
import { lockDataFolder } from './lock-file.mjs';
import { describeListener, isPortFree } from './ports.mjs';
import { Problem } from './problem.mjs';

/** @typedef {import('./lifetime.mjs').Lifetime} Lifetime */

/**
 * Looks, before the long work, whether it can succeed: data folder, a start already running, ports.
 *
 * @param {Lifetime} lifetime
 * @param {import('./settings.mjs').Settings} settings
 * @param {{ program: string, ports: number[] }} options
 */
export async function prepareToServe(lifetime, settings, { program, ports }) {
  const { dataFolder, localUrl, publicUrl, host } = settings;
  openDataFolder(dataFolder);
  lockDataFolder(lifetime, dataFolder, { program, localUrl, publicUrl });
  for (const port of ports) {
    if (await isPortFree(port, host)) continue;
    const user = describeListener(port) || 'another program';
    throw new Problem(
      `Port ${port} on ${host} is in use by ${user}. Choose another one: PORT=${port + 10} ${program}`,
    );
  }
}
