import type { Mail } from '../../mail/send.ts'

interface Link {
  to: string
  purpose: 'invitation' | 'reset'
  token: string
  publicUrl: string
  firmName: string
}

/** The mail that carries a link. The token stands behind `#`, so that no server log or referrer ever holds it. */
export function linkMail({ to, purpose, token, publicUrl, firmName }: Link): Mail {
  const address = `${publicUrl}/password#${token}`
  return purpose === 'invitation'
    ? {
        to,
        subject: `Your account at ${firmName}`,
        text: `You are invited to work with ${firmName} in Wearcourse.\n\nSet your password here within seven days:\n${address}\n\nIf you did not expect this, do nothing.\n`,
      }
    : {
        to,
        subject: 'Set a new password',
        text: `Someone, probably you, asked to set a new password for ${firmName} in Wearcourse.\n\nThe link works once, within one hour:\n${address}\n\nIf it was not you, do nothing: your password stays as it is.\n`,
      }
}
