import { fileURLToPath } from 'node:url';
import { defineConfig } from 'astro/config';
import mdx from '@astrojs/mdx';
import node from '@astrojs/node';
import react from '@astrojs/react';
import tailwind from '@astrojs/tailwind';
import auth from 'auth-astro';
import { parseWorker } from './scripts/parseWorkerPlugin.mjs';

export default defineConfig({
  output: 'server',
  adapter: node({ mode: 'middleware' }),
  integrations: [react(), mdx(), tailwind({ applyBaseStyles: false }), auth()],
  // Hosts are checked in server.mjs, which knows APP_ORIGIN; Astro would otherwise lose the port of the
  // request's URL and refuse every form. Where a changing request comes from is checked by our own middleware:
  // Astro's check turns away every API client that sends no body and no Origin.
  security: { checkOrigin: false, allowedDomains: [{}] },
  // A sheet is drawn without waiting for a second request: at a bench the network is often poor.
  build: { inlineStylesheets: 'always' },
  trailingSlash: 'ignore',
  devToolbar: { enabled: false },
  server: { port: Number(process.env.PORT ?? 4321), host: process.env.HOST ?? '127.0.0.1' },
  vite: {
    // Astro reads these from tsconfig.json for pages, but not for the bundle of a web worker.
    resolve: {
      alias: {
        '@': fileURLToPath(new URL('./src', import.meta.url)),
        '@db': fileURLToPath(new URL('./db', import.meta.url)),
      },
    },
    plugins: [parseWorker()],
    ssr: {
      external: ['sqlite3', 'sequelize', 'umzug', '@node-rs/argon2', 'sharp', 'busboy', 'file-type', 'flydrive'],
    },
  },
});
