import './node-version.mjs';

import { showCommand } from './commands.mjs';
import { runProgram } from './program.mjs';
import { installNodeModulesStep } from './set-up.mjs';
import { readSettings } from './settings.mjs';

/** `npm run bench`: the benchmarks in test/bench; arguments are passed on. */
await runProgram(
  async (lifetime, say) => {
    const { projectFolder } = readSettings({});
    await installNodeModulesStep(lifetime, say, projectFolder);
    const args = ['--import', 'tsx', 'test/bench/run.ts', ...process.argv.slice(2)];
    return showCommand(lifetime, process.execPath, args, { cwd: projectFolder, env: process.env });
  },
  { signalExitCode: 130 },
);
