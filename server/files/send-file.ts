import type { Request, Response } from 'express'
import { pipeline } from 'node:stream/promises'
import type { FileStore } from './store.ts'

interface Sent {
  files: FileStore
  sha256: string
  /** Name the file is saved under. */
  name: string
  type: string
  request: Request
  response: Response
}

/** Answers with a stored file, whole or in one range (RFC 9110, 14): always to be saved, never to be shown in this site's name. */
export async function sendFile({ files, sha256, name, type, request, response }: Sent): Promise<void> {
  const size = await files.size(sha256)
  const etag = `"${sha256}"`
  response.set({
    'Content-Type': type,
    'Content-Disposition': attachment(name),
    'Content-Security-Policy': "sandbox; default-src 'none'",
    'X-Content-Type-Options': 'nosniff',
    'Accept-Ranges': 'bytes',
    ETag: etag,
    // Kept by the browser, but asked for again each time: who may no longer see it does not.
    'Cache-Control': 'private, no-cache',
  })
  if (request.headers['if-none-match'] === etag) {
    response.status(304).end()
    return
  }
  const ifRange = request.headers['if-range']
  const range = ifRange === undefined || ifRange === etag ? rangeOf(request.headers.range, size) : undefined
  if (range === 'beyond') {
    response.status(416).set('Content-Range', `bytes */${size}`).end()
    return
  }
  if (range) response.status(206).set('Content-Range', `bytes ${range.start}-${range.end}/${size}`)
  response.set('Content-Length', String(range ? range.end - range.start + 1 : size))
  try {
    await pipeline(files.read(sha256, range), response)
  } catch (error) {
    // A reader that goes away in the middle is no fault; anything else ends the connection, since the head is out.
    if ((error as NodeJS.ErrnoException).code !== 'ERR_STREAM_PREMATURE_CLOSE') response.destroy()
  }
}

/** The one range asked for; undefined for the whole file (no range, several, or none that can be read). */
export function rangeOf(header: string | undefined, size: number): { start: number; end: number } | 'beyond' | undefined {
  const match = /^bytes=(\d*)-(\d*)$/.exec(header?.trim() ?? '')
  if (!match || (match[1] === '' && match[2] === '')) return undefined
  const [, first = '', last = ''] = match
  const start = first === '' ? Math.max(0, size - Number(last)) : Number(first)
  const end = first === '' || last === '' ? size - 1 : Math.min(Number(last), size - 1)
  if (first !== '' && last !== '' && Number(last) < Number(first)) return undefined
  return start >= size || (first === '' && Number(last) === 0) ? 'beyond' : { start, end }
}

/** `attachment` with a plain name for old readers and the full one after RFC 6266 and RFC 8187. */
export function attachment(name: string): string {
  const plain = name
    .normalize('NFKD')
    .replace(/[\u0300-\u036f]/g, '')
    .replace(/[^\x20-\x7e]/g, '_')
    .replace(/["\\%;]/g, '_')
  const full = encodeURIComponent(name).replace(/['()*]/g, (character) => `%${character.charCodeAt(0).toString(16).toUpperCase()}`)
  return `attachment; filename="${plain}"; filename*=UTF-8''${full}`
}
