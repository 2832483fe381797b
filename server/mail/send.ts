import { mkdir, readFile, readdir, rename, writeFile } from 'node:fs/promises'
import { join } from 'node:path'
import { createTransport } from 'nodemailer'

export interface Mail {
  to: string
  subject: string
  text: string
}
export interface KeptMail extends Mail {
  id: string
  at: string
}
export interface Mailer {
  send(mail: Mail): Promise<void>
  /** Mail kept here because no mail server is set, newest first. */
  outbox(): Promise<KeptMail[]>
}

/** Sends over SMTP. */
export function smtpMailer({ url, from }: { url: string; from: string }): Mailer {
  const transport = createTransport(url)
  return {
    async send(mail) {
      await transport.sendMail({ from, ...mail })
    },
    outbox: () => Promise.resolve([]),
  }
}

/** Keeps mail in `DATA_DIR/outbox`, one file a message, for a technical lead to read. */
export async function outboxMailer(dataDir: string, clock: () => number): Promise<Mailer> {
  const folder = join(dataDir, 'outbox')
  await mkdir(folder, { recursive: true, mode: 0o700 })
  let count = 0
  return {
    async send(mail) {
      const at = new Date(clock()).toISOString()
      const id = `${at.replace(/[:.]/g, '-')}-${String(++count).padStart(4, '0')}`
      const path = join(folder, `${id}.json`)
      await writeFile(`${path}.part`, JSON.stringify({ id, at, ...mail }, null, 2), { mode: 0o600 })
      await rename(`${path}.part`, path)
    },
    async outbox() {
      const names = (await readdir(folder))
        .filter((name) => name.endsWith('.json'))
        .sort()
        .reverse()
      return Promise.all(names.map(async (name) => JSON.parse(await readFile(join(folder, name), 'utf8')) as KeptMail))
    },
  }
}
