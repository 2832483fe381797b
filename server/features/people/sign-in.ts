import { AppError } from '../../../shared/api/errors.ts'
import type { User } from '../../../shared/api/session.ts'
import type { Database } from '../../db/open.ts'
import { passwordFits } from './password.ts'
import { countFailure, findForSignIn, forgetFailures, readFailures, recordSignIn } from './queries.ts'

/** Tries before each further one has to wait. */
const free = 5
const longestWait = 15 * 60_000

/** Wait after so many failures: 1 s, doubling, at most 15 minutes. Counted on the address, known or not; a wait is no lock-out. */
export function waitAfter(failures: number): number {
  return failures < free ? 0 : Math.min(longestWait, 1000 * 2 ** (failures - free))
}

/**
 * The person with this address and password, or undefined. Unknown address, wrong password and disabled account are one answer that takes the same work.
 * @throws AppError `too-many` while the address has to wait.
 */
export async function checkPassword(
  db: Database,
  credentials: { email: string; password: string; now: number },
): Promise<User | undefined> {
  const { password, now } = credentials
  const email = credentials.email.trim().toLowerCase()
  const before = await readFailures(db, email)
  if (before && now - Date.parse(before.lastAt) < waitAfter(before.failures)) throw new AppError('too-many')
  const person = await findForSignIn(db, email)
  if (!(await passwordFits(person?.passwordHash, password)) || !person) {
    await countFailure(db, email, now)
    await recordSignIn(db, { personId: null, action: 'sign-in-refused', email })
    return undefined
  }
  if (before) await forgetFailures(db, email)
  await recordSignIn(db, { personId: person.id, action: 'signed-in', email })
  return { id: person.id, name: person.name, email: person.email, role: person.role }
}
