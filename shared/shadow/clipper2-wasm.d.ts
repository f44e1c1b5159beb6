/** The package types its module but not the file that a bundler and Node both can load. */
declare module 'clipper2-wasm/dist/es/clipper2z.js' {
  import type { MainModule } from 'clipper2-wasm/dist/clipper2z';

  export default function createModule(options: {
    wasmBinary: Uint8Array | ArrayBuffer;
  }): Promise<MainModule>;
}
