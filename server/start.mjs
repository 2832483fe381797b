// Plain JavaScript: runs before anything is installed. `node server/start.mjs` serves; with `dev`, `test`, `check` or `bench` it only prepares for that.
import { spawn, spawnSync } from 'node:child_process'
import { existsSync, readFileSync, readdirSync, statSync, writeFileSync } from 'node:fs'
import { createHash } from 'node:crypto'
import { dirname, join } from 'node:path'
import { fileURLToPath } from 'node:url'

const root = join(dirname(fileURLToPath(import.meta.url)), '..')
const say = (line) => process.stdout.write(`${line}\n`)

function fail(sentence) {
  process.stderr.write(`${sentence}\n`)
  process.exit(1)
}

/** Runs a command in the project; its output is shown, its failure ends everything. */
function run(command, args, failure) {
  const done = spawnSync(command, args, { cwd: root, stdio: 'inherit', env: process.env })
  if (done.error || done.status !== 0) fail(failure)
}

const hashOf = (...paths) => {
  const hash = createHash('sha256')
  for (const path of paths) hash.update(path.slice(root.length)).update(readFileSync(path))
  return hash.digest('hex')
}

/** Every file of the folders, in a fixed order. */
function filesIn(folder) {
  return readdirSync(folder, { withFileTypes: true, recursive: true })
    .filter((entry) => entry.isFile())
    .map((entry) => join(entry.parentPath ?? entry.path, entry.name))
    .sort()
}

const isDone = (mark, hash) => existsSync(mark) && readFileSync(mark, 'utf8') === hash

function checkNode() {
  const [major, minor] = process.versions.node.split('.').map(Number)
  if (major < 20 || (major === 20 && minor < 19)) fail(`Wearcourse needs Node.js 20.19 or newer; this is ${process.versions.node}.`)
}

export function install() {
  checkNode()
  const lock = join(root, 'package-lock.json')
  if (!existsSync(lock)) fail('package-lock.json is missing; the clone is not whole.')
  const mark = join(root, 'node_modules/.installed')
  const hash = hashOf(lock)
  if (isDone(mark, hash)) return
  say('Installing packages from the lock file …')
  run(
    'npm',
    ['ci', '--no-audit', '--no-fund', '--loglevel=error'],
    'The packages could not be installed. Is the npm registry within reach?',
  )
  writeFileSync(mark, hash)
}

export function build() {
  const sources = [
    ...filesIn(join(root, 'src')),
    ...filesIn(join(root, 'shared')),
    ...filesIn(join(root, 'public')),
    join(root, 'index.html'),
    join(root, 'vite.config.ts'),
    join(root, 'package-lock.json'),
  ]
  const mark = join(root, 'node_modules/.built')
  const hash = hashOf(...sources.filter((path) => !/\.test\.tsx?$/.test(path) && statSync(path).isFile()))
  if (existsSync(join(root, 'dist/index.html')) && isDone(mark, hash)) return
  say('Building the pages …')
  run(process.execPath, ['node_modules/vite/bin/vite.js', 'build', '--logLevel', 'warn'], 'The pages could not be built.')
  writeFileSync(mark, hash)
}

/** Runs the server in a process of its own and passes signals and its end on. */
function serve() {
  const child = spawn(process.execPath, ['--import', 'tsx', join(root, 'server/main.ts')], {
    cwd: root,
    stdio: 'inherit',
    env: process.env,
  })
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => child.kill(signal))
  child.on('exit', (code, signal) => process.exit(code ?? (signal ? 1 : 0)))
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  const [, , what = 'serve'] = process.argv
  install()
  if (what !== 'prepare') build()
  if (what === 'serve') serve()
}
