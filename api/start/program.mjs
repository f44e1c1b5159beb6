import { Lifetime, Stopped } from './lifetime.mjs';
import { Problem } from './problem.mjs';
import { Say, tailOf } from './say.mjs';

/**
 * Runs an entry file's main function and ends the process when it is done, when a signal asks for
 * it, or when it fails; in every case what was started is stopped first.
 *
 * @param {(lifetime: Lifetime, say: Say) => Promise<number>} main gives the exit code
 * @param {{ signalExitCode: number }} options the exit code after Ctrl-C, SIGTERM or SIGHUP
 */
export async function runProgram(main, { signalExitCode } = { signalExitCode: 0 }) {
  const lifetime = new Lifetime();
  const say = new Say();

  /** @param {number} exitCode */
  const end = async (exitCode) => {
    process.exitCode ??= exitCode;
    await lifetime.stop();
    process.exit();
  };

  // After a hang-up or `| head` nobody reads any more; stopping in order matters more.
  for (const stream of [process.stdout, process.stderr]) stream.on('error', () => undefined);

  for (const signal of /** @type {const} */ (['SIGINT', 'SIGTERM', 'SIGHUP'])) {
    // npm passes on a signal that the terminal has sent already, so the same one may come twice.
    process.on(signal, () => {
      if (!lifetime.isStopping()) say.line('Stopping …');
      void end(signalExitCode);
    });
  }

  try {
    await end(await main(lifetime, say));
  } catch (error) {
    if (!(error instanceof Stopped) && !lifetime.isStopping()) reportFailure(say, error);
    await end(1);
  }
}

/**
 * @param {Say} say
 * @param {unknown} error
 */
function reportFailure(say, error) {
  if (error instanceof Problem) {
    say.line(error.message);
    say.block(tailOf(error.output));
  } else {
    say.line(`Unexpected: ${error instanceof Error ? String(error.stack) : String(error)}`);
  }
}
