import { chmodSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { onTestFinished } from 'vitest';

/** A folder for one test, which the database's user can pass through; removed when the test is done. */
export function makeTemporaryFolder(): string {
  const folder = mkdtempSync(path.join(tmpdir(), 'noonmark-start-'));
  chmodSync(folder, 0o711);
  onTestFinished(() => rmSync(folder, { recursive: true, force: true }));
  return folder;
}
