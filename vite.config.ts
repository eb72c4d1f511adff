// Build of the page, and the two kinds of tests: `unit` runs in Node, `browser` drives the built page.

import type { Plugin } from 'vite';
import solid from 'vite-plugin-solid';
import { defineConfig } from 'vitest/config';

/** Drops the woff and ttf forms of each KaTeX face, which no browser that runs this page would ask for. */
function woff2Only(): Plugin {
  return {
    name: 'woff2-only',
    enforce: 'pre',
    transform(code, id) {
      if (!/katex[^?]*\.css/.test(id)) return null;
      return { code: code.replace(/,\s*url\([^)]*\.(?:woff|ttf)\)\s*format\([^)]*\)/g, ''), map: null };
    },
  };
}

/** The development server puts styles into the page as elements, which the page's own policy refuses. */
function inlineStylesWhileDeveloping(): Plugin {
  return {
    name: 'inline-styles-while-developing',
    apply: 'serve',
    transformIndexHtml: (html) => html.replace("style-src 'self'", "style-src 'self' 'unsafe-inline'"),
  };
}

export default defineConfig({
  base: './',
  // What is not there is answered by 404, while developing as on a plain host.
  appType: 'mpa',
  plugins: [solid(), woff2Only(), inlineStylesWhileDeveloping()],
  build: {
    target: 'es2022',
    // A font below the default limit would become a data: address, which the page's policy refuses.
    assetsInlineLimit: 0,
    modulePreload: { polyfill: false },
  },
  worker: { format: 'es' },
  preview: { host: '127.0.0.1' },
  test: {
    environment: 'node',
    projects: [
      {
        extends: true,
        test: {
          name: 'unit',
          include: ['test/**/*.test.ts', 'test/**/*.test.tsx'],
          exclude: ['test/browser/**'],
          setupFiles: ['test/support/quiet-console.ts'],
          // A stuck test ends; a slow machine is no fault.
          testTimeout: 120_000,
        },
      },
      {
        extends: true,
        test: {
          name: 'browser',
          include: ['test/browser/**/*.test.ts'],
          globalSetup: ['test/support/browser-setup.ts'],
          // A page on a busy machine is slow and no fault; a stuck one ends.
          testTimeout: 300_000,
          expect: { poll: { timeout: 30_000 } },
        },
      },
    ],
  },
});
