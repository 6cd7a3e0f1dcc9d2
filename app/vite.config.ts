/**
 * Builds the command line: one environment, the sources in, `dist/node/dosewright.js` and its lazily loaded
 * parts out. Packages are bundled, so that the built program runs with nothing beside it.
 */
import { fileURLToPath } from 'node:url'
import { defineConfig } from 'vite'

const fromRoot = (path: string): string => fileURLToPath(new URL(`../${path}`, import.meta.url))

/** What `npm run build` does. */
export default defineConfig({
  root: fromRoot('.'),
  logLevel: 'warn',
  publicDir: false,
  build: {
    ssr: true,
    target: 'node22',
    outDir: fromRoot('dist/node'),
    emptyOutDir: true,
    minify: false,
    rolldownOptions: {
      input: { dosewright: fromRoot('app/command/dosewright.ts') },
      output: { format: 'es', entryFileNames: '[name].js', chunkFileNames: '[name].js' },
    },
  },
  ssr: { noExternal: true },
})
