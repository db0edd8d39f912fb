import { resolve } from 'node:path';
import react from '@vitejs/plugin-react';
import type { Plugin } from 'vite';
import { VitePWA } from 'vite-plugin-pwa';
import { defineConfig } from 'vitest/config';

const contentSecurityPolicy = [
  "default-src 'self'",
  "script-src 'self'",
  "style-src 'self' 'unsafe-inline'",
  "img-src 'self' data: blob:",
  "font-src 'self' data:",
  "worker-src 'self' blob:",
  "connect-src 'self' blob:",
  "object-src 'none'",
  "base-uri 'none'",
  "form-action 'none'",
].join('; ');

/** The built page carries its policy with it; the development server needs inline scripts of its own. */
function policy(): Plugin {
  return {
    name: 'content-security-policy',
    apply: 'build',
    transformIndexHtml: () => [
      {
        tag: 'meta',
        attrs: { 'http-equiv': 'Content-Security-Policy', content: contentSecurityPolicy },
        injectTo: 'head-prepend',
      },
    ],
  };
}

/** Optional parts of the PDF libraries that draw rasters and parse markup: never used, left out. */
const absent = resolve(import.meta.dirname, 'src/sheet/pdf/absent.ts');

export default defineConfig({
  plugins: [
    react(),
    policy(),
    VitePWA({
      registerType: 'autoUpdate',
      injectRegister: 'script',
      workbox: { globPatterns: ['**/*.{html,js,css,json,svg,ttf,woff2}'] },
      manifest: {
        name: 'Varwright',
        short_name: 'Varwright',
        description: 'Power-factor correction and harmonic studies',
        theme_color: '#f6f3ec',
        background_color: '#f6f3ec',
        icons: [{ src: 'icon.svg', sizes: 'any', type: 'image/svg+xml' }],
      },
    }),
  ],
  resolve: { alias: { canvg: absent, html2canvas: absent, dompurify: absent } },
  worker: { format: 'es' },
  build: { target: 'es2023', chunkSizeWarningLimit: 700 },
  test: {
    include: ['tests/**/*.test.ts', 'tests/**/*.test.tsx'],
    environment: 'node',
    testTimeout: 20_000,
  },
});
