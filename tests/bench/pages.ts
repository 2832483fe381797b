import { mkdir, mkdtemp, readFile, rm, symlink, writeFile } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { gzipSync } from 'node:zlib'
import react from '@vitejs/plugin-react'
import { build } from 'vite'
import { round } from './measure.ts'

const root = join(import.meta.dirname, '../..')
interface Chunk {
  file: string
  imports?: string[]
  isEntry?: boolean
}
type Manifest = Record<string, Chunk>

/** Kilobytes (gzip) of an entry and all that it imports at once. */
async function weight(manifest: Manifest, names: string[], folder: string): Promise<number> {
  const files = new Set<string>()
  const add = (name: string) => {
    const chunk = manifest[name]
    if (!chunk || files.has(chunk.file)) return
    files.add(chunk.file)
    chunk.imports?.forEach(add)
  }
  names.forEach(add)
  let bytes = 0
  for (const file of files) if (file.endsWith('.js')) bytes += gzipSync(await readFile(join(folder, file))).length
  return round(bytes / 1024)
}

async function built(folder: string, outDir: string): Promise<Manifest> {
  await build({
    root: folder,
    configFile: folder === root ? join(root, 'vite.config.ts') : false,
    logLevel: 'silent',
    ...(folder === root ? {} : { plugins: [react()] }),
    build: { outDir, manifest: true, emptyOutDir: true },
  })
  return JSON.parse(await readFile(join(outDir, '.vite/manifest.json'), 'utf8')) as Manifest
}

const bare = `import { createRoot } from 'react-dom/client'
import { createBrowserRouter } from 'react-router'
import { RouterProvider } from 'react-router/dom'
import { QueryClient, QueryClientProvider, useQuery } from '@tanstack/react-query'
function Page() { const { data } = useQuery({ queryKey: ['x'], queryFn: () => 'x' }); return <p>{data}</p> }
const router = createBrowserRouter([{ path: '/', element: <Page /> }])
createRoot(document.body).render(<QueryClientProvider client={new QueryClient()}><RouterProvider router={router} /></QueryClientProvider>)
`

/** JavaScript of each page, gzip kB, beside an empty page of React, Router and Query built the same way. */
export async function pageWeights() {
  const folder = await mkdtemp(join(tmpdir(), 'wearcourse-bench-'))
  try {
    const empty = join(folder, 'empty')
    await mkdir(empty)
    await symlink(join(root, 'node_modules'), join(empty, 'node_modules'))
    await writeFile(join(empty, 'index.html'), '<!doctype html><body><script type="module" src="/main.tsx"></script></body>')
    await writeFile(join(empty, 'main.tsx'), bare)
    const baseline = await weight(await built(empty, join(folder, 'empty-dist')), ['index.html'], join(folder, 'empty-dist'))
    const dist = join(folder, 'dist')
    const manifest = await built(root, dist)
    const pages = Object.keys(manifest).filter((name) => /-page\.tsx$/.test(name))
    const weights: Record<string, { ratio: number; kB: number }> = {}
    for (const page of pages) {
      const kB = await weight(manifest, ['index.html', page], dist)
      weights[page.replace('src/features/', '')] = { ratio: round(kB / baseline), kB }
    }
    return { emptyPageKB: baseline, pages: weights }
  } finally {
    await rm(folder, { recursive: true, force: true })
  }
}
