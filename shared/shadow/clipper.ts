import type { MainModule } from 'clipper2-wasm/dist/clipper2z';
import createModule from 'clipper2-wasm/dist/es/clipper2z.js';

/** The polygon library Clipper2, compiled to WebAssembly. */
export type Clipper = MainModule;

/** Starts Clipper2 from its compiled bytes (`clipper2-wasm/dist/es/clipper2z.wasm`). */
export async function createClipper(wasmBinary: Uint8Array | ArrayBuffer): Promise<Clipper> {
  return createModule({ wasmBinary });
}
