import { spawn } from 'node:child_process'
import { join } from 'node:path'
import { readEnvironment } from './env.ts'

// Pages with reload by Vite on PORT (4620), the API behind them on the port after it, started anew when a file of the server changes.
const root = join(import.meta.dirname, '..')
const { port, publicUrl } = readEnvironment(process.env)
const apiPort = String(port + 1)
const children = [
  spawn(process.execPath, ['--watch-path=server', '--watch-path=shared', '--watch-preserve-output', '--import', 'tsx', 'server/main.ts'], {
    cwd: root,
    stdio: 'inherit',
    env: { ...process.env, PORT: apiPort, PUBLIC_URL: publicUrl },
  }),
  spawn(process.execPath, ['node_modules/vite/bin/vite.js', '--port', String(port), '--strictPort'], {
    cwd: root,
    stdio: 'inherit',
    env: { ...process.env, API_PORT: apiPort },
  }),
]
const end = () => children.forEach((child) => child.kill('SIGINT'))
for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, end)
for (const child of children) child.on('exit', end)
