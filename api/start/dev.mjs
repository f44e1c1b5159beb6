import './node-version.mjs';

import { describeEnding, startChild } from './children.mjs';
import { waitUntilReady } from './health.mjs';
import { prepareToServe } from './prepare.mjs';
import { runProgram } from './program.mjs';
import { setUp } from './set-up.mjs';
import { loadDotEnv, readSettings } from './settings.mjs';
import { VITE_PROGRAM } from './web-build.mjs';

/**
 * `npm run dev`: the set-up of `npm start` without the build; then the client, the API (on the port
 * above) and a worker, each reloading when its sources change.
 */
await runProgram(async (lifetime, say) => {
  loadDotEnv();
  const settings = readSettings(process.env);
  const { projectFolder, localUrl, host, port } = settings;
  const apiPort = port + 1;
  say.line('Noonmark, for development');
  await prepareToServe(lifetime, settings, { program: 'npm run dev', ports: [port, apiPort] });
  const { environment, databaseEnded } = await setUp(lifetime, say, settings);

  const env = {
    LOG_LEVEL: 'info',
    ...environment,
    PORT: String(apiPort),
    API_PORT: String(apiPort),
  };
  const start = (/** @type {string[]} */ args) =>
    startChild(lifetime, process.execPath, args, {
      cwd: projectFolder,
      env,
      stdio: ['ignore', 'inherit', 'inherit'],
    });
  const reloading = ['--watch', '--watch-preserve-output', '--import', 'tsx'];
  const worker = start([...reloading, 'api/worker.ts']);
  const server = start([...reloading, 'api/server.ts']);
  const apiUrl = localUrl.replace(/\d+$/, String(apiPort));
  await say.step(
    'API',
    () => waitUntilReady(apiUrl, server),
    () => `ready on port ${apiPort}`,
    { isShownAtOnce: false },
  );
  const vite = start([VITE_PROGRAM, '--host', host, '--port', String(port), '--strictPort']);
  say.line(`Noonmark is ready at ${localUrl}. Stop it with Ctrl-C.`);

  return await Promise.race([
    ...Object.entries({ API: server, worker, 'client server': vite }).map(async ([name, child]) => {
      const ending = await child.ended;
      if (!lifetime.isStopping()) say.line(`The ${name} ended (${describeEnding(ending)}).`);
      return ending.code ?? 1;
    }),
    databaseEnded.then(() => {
      if (!lifetime.isStopping()) say.line('The database ended; its log is in the data folder.');
      return 1;
    }),
  ]);
});
