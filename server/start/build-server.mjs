/** Bundles the server: the process, its worker thread and the admin command, every package left outside. */
import { rmSync } from 'node:fs'
import { build } from 'esbuild'

// A build by hand may be of other sources than the stamp says: only `prepare.mjs` writes it, after this.
rmSync('dist/.built', { force: true })

await build({
  entryPoints: {
    main: 'server/main.ts',
    worker: 'server/compute/worker.ts',
    'create-admin': 'server/create-admin.ts',
  },
  outdir: 'dist/server',
  bundle: true,
  packages: 'external',
  platform: 'node',
  format: 'esm',
  target: 'node20',
  sourcemap: true,
  logLevel: 'warning',
})
