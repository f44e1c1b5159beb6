/**
 * Ends the program with one line unless it runs under the Node that the project is built for.
 * The entry files import this file first, so that nothing newer than the check runs before it.
 */
const [major = 0, minor = 0] = process.versions.node.split('.').map(Number);

if (major !== 20 || minor < 20) {
  process.stderr.write(
    `Noonmark needs Node 20 (20.20 or a later 20); this is Node ${process.versions.node}.\n`,
  );
  process.exit(1);
}
