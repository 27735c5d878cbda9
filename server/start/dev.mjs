/** `npm run dev`: Express restarted on every change, Vite with reload in front of it. Ctrl-C ends both. */
import concurrently from 'concurrently'

const apiPort = process.env.API_PORT ?? '4174'

const { result } = concurrently(
  [
    { name: 'server', command: 'tsx watch --clear-screen=false server/main.ts', env: { PORT: apiPort } },
    { name: 'client', command: 'vite', env: { API_PORT: apiPort } },
  ],
  { killOthersOn: ['failure', 'success'], prefixColors: ['cyan', 'magenta'] },
)

await result.catch(() => {
  process.exitCode = 1
})
