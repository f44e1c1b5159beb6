import './node-version.mjs';

import { describeEnding, startChild } from './children.mjs';
import { waitUntilReady } from './health.mjs';
import { prepareToServe } from './prepare.mjs';
import { runProgram } from './program.mjs';
import { setUp } from './set-up.mjs';
import { loadDotEnv, readSettings } from './settings.mjs';
import { keepRunning } from './supervise.mjs';
import { buildWeb } from './web-build.mjs';

/** `npm start`: sets up what is missing, then serves until it is stopped. */
await runProgram(async (lifetime, say) => {
  loadDotEnv();
  const settings = readSettings(process.env);
  const { projectFolder, localUrl, publicUrl, port } = settings;
  say.line('Noonmark');
  await prepareToServe(lifetime, settings, { program: 'npm start', ports: [port] });
  const { environment, databaseEnded } = await setUp(lifetime, say, settings);
  await say.step(
    'Web client',
    () => buildWeb(lifetime, projectFolder),
    (state) => state,
  );

  const startProgram = (/** @type {string} */ file) =>
    startChild(lifetime, process.execPath, ['--import', 'tsx', file], {
      cwd: projectFolder,
      // A quiet terminal for trying it out; an operator wants the account of requests.
      env: { LOG_LEVEL: settings.isProduction ? 'info' : 'warn', ...environment },
      stdio: ['ignore', 'inherit', 'inherit'],
    });
  const worker = keepRunning(lifetime, () => startProgram('api/worker.ts'), {
    report: (text) => say.line(`The worker ${text}.`),
  });
  const server = startProgram('api/server.ts');
  await say.step(
    'Server',
    () => waitUntilReady(localUrl, server),
    () => 'ready',
    { isShownAtOnce: false },
  );
  say.line('');
  say.line(`Noonmark is ready at ${localUrl}`);
  if (publicUrl !== localUrl) say.line(`Its public address is ${publicUrl}`);
  say.line('Stop it with Ctrl-C.');

  return await Promise.race([
    server.ended.then((ending) => {
      if (!lifetime.isStopping()) say.line(`The server ended (${describeEnding(ending)}).`);
      return ending.code ?? 1;
    }),
    databaseEnded.then(() => {
      if (!lifetime.isStopping()) say.line('The database ended; its log is in the data folder.');
      return 1;
    }),
    worker.then(() => 1),
  ]);
});
