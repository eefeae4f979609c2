import react from '@vitejs/plugin-react';
import { fileURLToPath } from 'node:url';
import type { Plugin } from 'vite';
import { defineConfig } from 'vitest/config';

const here = (path: string) => fileURLToPath(new URL(path, import.meta.url));

/**
 * Security policy of the built page: nothing but its own origin, no inline script. The hash is that of the empty style
 * element the chart library fills through the CSSOM. The development server injects inline scripts, so it has none.
 */
const policy = [
  "default-src 'self'",
  "script-src 'self'",
  "style-src-elem 'self' 'sha256-47DEQpj8HBSa+/TImW+5JCeuQeRkm5NMpJWZG3hSuFU='",
  "style-src-attr 'unsafe-inline'",
  "img-src 'self' data: blob:",
  "worker-src 'self'",
  "connect-src 'self'",
  "font-src 'self'",
  "object-src 'none'",
  "base-uri 'none'",
  "form-action 'none'",
].join('; ');

const securityPolicy: Plugin = {
  name: 'security-policy',
  apply: 'build',
  transformIndexHtml: () => [
    { tag: 'meta', attrs: { 'http-equiv': 'Content-Security-Policy', content: policy }, injectTo: 'head-prepend' },
  ],
};

/** Relative base: the built folder works under any path. */
export default defineConfig({
  base: './',
  plugins: [react(), securityPolicy],
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
