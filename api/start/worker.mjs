import './node-version.mjs';

import { startChild } from './children.mjs';
import { runProgram } from './program.mjs';
import { readRunningEnvironment } from './running-environment.mjs';
import { loadDotEnv, readSettings } from './settings.mjs';

/** `npm run worker`: one more worker beside a running `npm start`, or for the database in DATABASE_URL. */
await runProgram(async (lifetime, say) => {
  loadDotEnv();
  const settings = readSettings(process.env);
  const { environment } = readRunningEnvironment(settings);
  const worker = startChild(lifetime, process.execPath, ['--import', 'tsx', 'api/worker.ts'], {
    cwd: settings.projectFolder,
    env: { LOG_LEVEL: 'info', ...environment },
    stdio: ['ignore', 'inherit', 'inherit'],
  });
  say.line('A worker is running. Stop it with Ctrl-C.');
  const { code } = await worker.ended;
  return code ?? 1;
});
