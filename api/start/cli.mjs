import './node-version.mjs';

import { existsSync } from 'node:fs';
import path from 'node:path';

import { showCommand } from './commands.mjs';
import { Problem } from './problem.mjs';
import { runProgram } from './program.mjs';
import { readRunningEnvironment } from './running-environment.mjs';
import { loadDotEnv, readSettings } from './settings.mjs';

/** `npm run cli -- NAME …`: runs api/cli/NAME.ts with the connections of the running start. */
await runProgram(
  async (lifetime) => {
    loadDotEnv();
    const [name = '', ...args] = process.argv.slice(2);
    const settings = readSettings(process.env);
    const file = `api/cli/${name}.ts`;
    if (!/^[a-z-]+$/.test(name) || !existsSync(path.join(settings.projectFolder, file))) {
      throw new Problem(`There is no command "${name}": give the name of a file in api/cli.`);
    }
    const { ownerEnvironment } = readRunningEnvironment(settings);
    return showCommand(lifetime, process.execPath, ['--import', 'tsx', file, ...args], {
      cwd: settings.projectFolder,
      env: { LOG_LEVEL: 'warn', ...ownerEnvironment },
    });
  },
  { signalExitCode: 130 },
);
