import { expect, it } from 'vitest';
import { generateFiles } from '../../sample-data/generator/files.ts';
import { readBytes } from './sample-files.ts';

it('gives the committed files byte for byte when it runs again', () => {
  const files = generateFiles();
  expect(files.size).toBe(22);
  for (const [path, bytes] of files) {
    expect(Buffer.compare(bytes, readBytes(path)), path).toBe(0);
  }
}, 60_000);
