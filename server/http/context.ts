import type { Database } from '../db/open.ts'
import type { FileStore } from '../files/store.ts'
import type { Mailer } from '../mail/send.ts'
import type { Sessions } from './session.ts'

/** What the features are given; nothing is reached for globally. */
export interface AppContext {
  db: Database
  files: FileStore
  mail: Mailer
  sessions: Sessions
  /** Epoch milliseconds. */
  clock: () => number
  /** Address for links in mail and QR codes; never taken from a request. */
  publicUrl: string
  /** Code printed at the start of an empty firm; makes the first technical lead, once. */
  firstLeadCode: string | undefined
  /** Shown on the sign-in page while the firm is the demo. */
  demo: { emails: string[]; password: string } | undefined
  log: (line: string) => void
}
