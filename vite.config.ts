import path from 'node:path';
import tailwindcss from '@tailwindcss/vite';
import react from '@vitejs/plugin-react';
import { defineConfig } from 'vite';

const apiPort = process.env['API_PORT'] ?? '8080';

export default defineConfig({
  root: path.join(import.meta.dirname, 'web'),
  plugins: [react(), tailwindcss()],
  build: {
    outDir: path.resolve(import.meta.dirname, process.env['WEB_OUT_DIR'] ?? 'dist'),
    emptyOutDir: true,
    // What each page loads: read by the test of the client's size; the server hands out no dot folder.
    manifest: true,
    target: 'es2022',
    // The content security policy allows fonts and scripts from our own address only, not data: addresses.
    assetsInlineLimit: 0,
    // MapLibre alone is larger than the default warning; it is loaded only where a map is shown.
    chunkSizeWarningLimit: 1200,
  },
  // MapLibre's worker and our own are modules.
  worker: { format: 'es' },
  server: {
    host: '127.0.0.1',
    proxy: { '/api': { target: `http://127.0.0.1:${apiPort}` } },
  },
});
