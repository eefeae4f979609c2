import react from '@vitejs/plugin-react';
import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';

const here = (path: string) => fileURLToPath(new URL(path, import.meta.url));

/** Relative base: the built folder works under any path. */
export default defineConfig({
  base: './',
  plugins: [react()],
  define: { global: 'globalThis' },
  worker: { format: 'es' },
  build: { target: 'es2022', outDir: 'dist', chunkSizeWarningLimit: 1500 },
  resolve: {
    alias: [
      // Optional parts of jspdf that draw HTML: not used here, and they would be a third of the download.
      { find: /^(html2canvas|canvg|dompurify)$/, replacement: here('src/export/absent.ts') },
      // The chart library brings the style sheet of a map library whose traces are not in our bundle.
      { find: /^maplibre-gl\/dist\/maplibre-gl\.css$/, replacement: here('src/panels/plot/empty.css') },
    ],
  },
  test: {
    include: ['test/**/*.test.ts'],
    exclude: ['test/bench/**', 'test/calibration/**'],
    environment: 'node',
    testTimeout: 60_000,
    pool: 'threads',
    maxWorkers: 2,
  },
});
