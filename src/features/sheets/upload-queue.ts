import { type Sheet, type UploadedFile, sheetEndpoints, uploadLimits } from '../../../shared/api/sheets.ts'
import { OfflineError, errorOf, sentenceOf } from '../../lib/api.ts'

type UploadState =
  | { step: 'waiting' }
  /** `sent`: 0 to 1. */
  | { step: 'sending'; sent: number }
  | { step: 'reading' }
  /** `saved`: the sheet once a person has checked what is said of it. */
  | { step: 'done'; result: UploadedFile; saved?: Sheet }
  | { step: 'failed'; message: string; canRetry: boolean }

export interface Upload {
  id: number
  ownerId: string
  file: File
  sheetId: string | undefined
  state: UploadState
}

/** Sent side by side: the server reads two at once, and a third is on its way. */
const sideBySide = 3

/** Uploads of this tab. They go on while other pages are looked at. */
class UploadQueue {
  #uploads: readonly Upload[] = []
  #nextId = 1
  readonly #listeners = new Set<() => void>()

  subscribe = (listener: () => void) => {
    this.#listeners.add(listener)
    return () => this.#listeners.delete(listener)
  }
  snapshot = () => this.#uploads

  add(files: readonly File[], { ownerId, sheetId }: { ownerId: string; sheetId?: string | undefined }): void {
    const added = files.map((file): Upload => ({ id: this.#nextId++, ownerId, file, sheetId, state: firstState(file) }))
    this.#set([...this.#uploads, ...added])
    this.#sendNext()
  }

  retry(id: number): void {
    this.#change(id, { step: 'waiting' })
    this.#sendNext()
  }

  checked(id: number, result: UploadedFile, saved: Sheet): void {
    this.#change(id, { step: 'done', result, saved })
  }

  remove(id: number): void {
    this.#set(this.#uploads.filter((upload) => upload.id !== id))
  }

  #set(uploads: readonly Upload[]): void {
    this.#uploads = uploads
    for (const listener of this.#listeners) listener()
  }

  #change(id: number, state: UploadState): void {
    this.#set(this.#uploads.map((upload) => (upload.id === id ? { ...upload, state } : upload)))
  }

  #sendNext(): void {
    const underWay = this.#uploads.filter(({ state }) => state.step === 'sending' || state.step === 'reading').length
    const next = this.#uploads.find(({ state }) => state.step === 'waiting')
    if (!next || underWay >= sideBySide) return
    this.#change(next.id, { step: 'sending', sent: 0 })
    void send(next, (state) => this.#change(next.id, state)).finally(() => this.#sendNext())
    this.#sendNext()
  }
}

/** What needs no server to be told. */
function firstState(file: File): UploadState {
  if (!/\.pdf$/i.test(file.name)) return { step: 'failed', message: 'This file is not a PDF.', canRetry: false }
  if (file.size > uploadLimits.bytes) return { step: 'failed', message: 'This file is larger than 25 MB.', canRetry: false }
  if (file.size === 0) return { step: 'failed', message: 'This file is empty.', canRetry: false }
  return { step: 'waiting' }
}

/** One request a file, so that each has its own progress and its own answer. XMLHttpRequest, since fetch tells no progress of sending. */
function send({ file, sheetId }: Upload, tell: (state: UploadState) => void): Promise<void> {
  return new Promise((resolve) => {
    const request = new XMLHttpRequest()
    const form = new FormData()
    if (sheetId) form.append('sheetId', sheetId)
    form.append('files', file, file.name)
    request.upload.onprogress = (event) => tell({ step: 'sending', sent: event.total > 0 ? event.loaded / event.total : 0 })
    request.upload.onload = () => tell({ step: 'reading' })
    request.onerror = () => {
      tell({ step: 'failed', message: new OfflineError().message, canRetry: true })
      resolve()
    }
    request.onload = () => void settle(request).then(tell).finally(resolve)
    request.open('POST', sheetEndpoints.uploadSheets.path)
    request.send(form)
  })
}

async function settle(request: XMLHttpRequest): Promise<UploadState> {
  const json = () => new Promise<unknown>((resolve) => resolve(JSON.parse(request.responseText)))
  if (request.status < 200 || request.status > 299) {
    const error = await errorOf({ status: request.status, json })
    return { step: 'failed', message: sentenceOf(error), canRetry: error.status === 429 || error.status === 503 || error.status === 401 }
  }
  const parsed = sheetEndpoints.uploadSheets.response.safeParse(await json().catch(() => undefined))
  const [result] = parsed.success ? parsed.data.files : []
  return result
    ? { step: 'done', result }
    : { step: 'failed', message: 'The answer of the server could not be read. Look in the list before you send it again.', canRetry: true }
}

export const uploadQueue = new UploadQueue()
