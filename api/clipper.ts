import { readFile } from 'node:fs/promises';
import { createClipper, type Clipper } from '../shared/shadow/clipper.ts';

/** Starts Clipper2 from the compiled bytes in its package. */
export async function loadClipper(): Promise<Clipper> {
  const path = new URL(import.meta.resolve('clipper2-wasm/dist/es/clipper2z.wasm'));
  return createClipper(await readFile(path));
}
