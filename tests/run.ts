import { spawnSync } from 'node:child_process'
import { existsSync } from 'node:fs'
import { join } from 'node:path'

const root = join(import.meta.dirname, '..')
const say = (line: string) => process.stdout.write(`${line}\n`)

/** Runs one step and shows what it prints; a step that fails ends the run with one sentence. */
function step(name: string, command: string, args: string[]): void {
  say(`\n— ${name}`)
  const done = spawnSync(command, args, { cwd: root, stdio: 'inherit', env: process.env })
  if (done.status === 0) return
  process.stderr.write(`\n${name}: failed.\n`)
  process.exit(1)
}

const node = (script: string, ...args: string[]) => [join(root, 'node_modules', script), ...args]

/** The browser of the journeys: Debian's Chromium, installed here when run as root. */
function browser(): void {
  const missing = [
    ['/usr/bin/chromium', 'chromium'],
    ['/usr/bin/pdftotext', 'poppler-utils'],
  ].flatMap(([path = '', name = '']) => (existsSync(path) ? [] : [name]))
  if (missing.length === 0) return
  if (process.getuid?.() !== 0) {
    process.stderr.write(`The browser tests need Debian's ${missing.join(' and ')}: apt-get install ${missing.join(' ')}\n`)
    process.exit(1)
  }
  step('Debian packages', 'apt-get', ['update', '-q'])
  step('Debian packages', 'apt-get', ['install', '-q', '-y', '--no-install-recommends', ...missing])
}

browser()
step('Types', process.execPath, node('typescript/bin/tsc', '-p', '.'))
step('Lint', process.execPath, node('eslint/bin/eslint.js', '.', '--max-warnings', '0'))
step(
  'Format',
  process.execPath,
  node('prettier/bin/prettier.cjs', '--check', '--log-level', 'warn', '**/*.{ts,tsx,js,cjs,mjs,css,html,md}', '!fixtures/**'),
)
step('Dead code', process.execPath, node('knip/bin/knip.js'))
step(
  'Directions',
  process.execPath,
  node(
    'dependency-cruiser/bin/dependency-cruise.mjs',
    'src',
    'server',
    'shared',
    'tests',
    '--config',
    '.dependency-cruiser.cjs',
    '--output-type',
    'err',
  ),
)
step('Unit, reference and API tests', process.execPath, node('vitest/vitest.mjs', 'run', '--project', 'unit'))
// The quick ones of `npm run test:postgres`, which runs them all.
const onServer = ['catalogue', 'build-ups', 'session', 'every-endpoint', 'one-connection'].map((name) => `tests/api/${name}.test.ts`)
step('The same on a PostgreSQL server', process.execPath, [
  '--import',
  'tsx',
  join(root, 'tests/setup/postgres.ts'),
  ...onServer,
  'server/db/backup.test.ts',
])
step('Build', process.execPath, [join(root, 'server/start.mjs'), 'build'])
step('Journeys in the browser', process.execPath, node('vitest/vitest.mjs', 'run', '--project', 'journeys'))
