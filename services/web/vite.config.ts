import { fileURLToPath } from 'node:url';
import react from '@vitejs/plugin-react';
import { defaultClientConditions, defineConfig } from 'vite';

const api = process.env['NOONWELL_API_URL'] ?? 'http://127.0.0.1:4300';

export default defineConfig({
  plugins: [react()],
  // Our own packages are read from their sources, so nothing has to be built first.
  resolve: {
    conditions: ['@noonwell/source', ...defaultClientConditions],
    alias: [
      {
        find: /^zod$/,
        replacement: fileURLToPath(new URL('./src/shared/zod-without-eval.ts', import.meta.url)),
      },
    ],
  },
  worker: { format: 'es' },
  build: {
    target: 'es2022',
    // Nothing is inlined as a data: address, which the content-security policy would refuse.
    assetsInlineLimit: 0,
    // The chart library is one lazily loaded file of this size.
    chunkSizeWarningLimit: 5000,
  },
  server: { proxy: { '/api': { target: api } } },
  preview: { proxy: { '/api': { target: api } } },
});
