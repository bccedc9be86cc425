import node from '@astrojs/node';
import react from '@astrojs/react';
import tailwindcss from '@tailwindcss/vite';
import { defineConfig } from 'astro/config';
import { noSchemaWriter, pureCore } from './src/commands/build/lean-browser-code.mjs';
import { figuresFace } from './src/styles/figures-face.mjs';

/** The daily server knows nothing of src/main.ts: this migrates, seeds and starts the worker once it listens. */
const backgroundWork = {
  name: 'background-work',
  hooks: {
    'astro:server:setup': ({ server }) => {
      server.httpServer?.once('listening', () => server.ssrLoadModule('/src/dev-boot.ts'));
    },
  },
};

/** Browsers of the last years; what they know need not be written out for older ones. */
const browsers = ['chrome111', 'firefox115', 'safari16.4'];

export default defineConfig({
  output: 'server',
  // Our own server in src/main.ts wraps Astro's handler: it drains requests on SIGTERM and limits bodies.
  adapter: node({ mode: 'middleware' }),
  integrations: [react(), backgroundWork],
  trailingSlash: 'never',
  devToolbar: { enabled: false },
  // Astro's own check refuses the signed webhooks and does not look at JSON posts; src/server/http/origin.ts does both.
  security: { checkOrigin: false },
  experimental: {
    csp: {
      directives: [
        "default-src 'self'",
        "base-uri 'none'",
        "object-src 'none'",
        "frame-ancestors 'none'",
        "form-action 'self'",
        "img-src 'self' data:",
      ],
    },
  },
  vite: {
    plugins: [figuresFace(), tailwindcss(), pureCore, noSchemaWriter],
    // The workers of pages are bundled apart.
    worker: { plugins: () => [pureCore, noSchemaWriter] },
    // Tokens are written light-dark(); for these browsers the minifier turns them into custom properties.
    build: { target: browsers, minify: 'terser', cssMinify: 'lightningcss', cssTarget: browsers },
  },
});
