import { spawn } from 'node:child_process'
import { join } from 'node:path'

// Pages with reload on http://localhost:4620 by Vite, the API behind them on 4621, started anew when a file of the server changes.
const root = join(import.meta.dirname, '..')
const apiPort = '4621'
const children = [
  spawn(process.execPath, ['--watch-path=server', '--watch-path=shared', '--watch-preserve-output', '--import', 'tsx', 'server/main.ts'], {
    cwd: root,
    stdio: 'inherit',
    env: { ...process.env, PORT: apiPort, PUBLIC_URL: 'http://localhost:4620' },
  }),
  spawn(process.execPath, ['node_modules/vite/bin/vite.js'], { cwd: root, stdio: 'inherit', env: { ...process.env, API_PORT: apiPort } }),
]
const end = () => children.forEach((child) => child.kill('SIGINT'))
process.on('SIGINT', end)
process.on('SIGTERM', end)
for (const child of children) child.on('exit', end)
