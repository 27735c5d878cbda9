import { fileURLToPath } from 'node:url'
import tailwindcss from '@tailwindcss/vite'
import react from '@vitejs/plugin-react'
import { defineConfig } from 'vite'

const apiTarget = `http://127.0.0.1:${process.env.API_PORT ?? '4174'}`

/** The browser application. `npm run dev` serves it with reload and passes `/api` on to Express. */
export default defineConfig({
  root: fileURLToPath(new URL('./client', import.meta.url)),
  plugins: [react(), tailwindcss()],
  worker: { format: 'es' },
  build: {
    outDir: fileURLToPath(new URL('./dist/client', import.meta.url)),
    emptyOutDir: true,
    // Fonts stay files: the content security policy allows no data: fonts.
    assetsInlineLimit: 0,
    sourcemap: true,
  },
  server: {
    host: '127.0.0.1',
    port: 5173,
    // The host stays as the browser names it: the server compares it with the page's origin.
    proxy: { '/api': { target: apiTarget, changeOrigin: false } },
  },
})
