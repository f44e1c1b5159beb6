import { mkdir, writeFile } from 'node:fs/promises';
import { dirname, join } from 'node:path';
import { generateFiles } from './generator/files.ts';

/** Writes the sample city beside this file: `npm run sample-data`. */
for (const [path, bytes] of generateFiles()) {
  const target = join(import.meta.dirname, path);
  await mkdir(dirname(target), { recursive: true });
  await writeFile(target, bytes);
  console.log(`${path}  ${Math.ceil(bytes.length / 1024)} KB`);
}
