import { createContext, useContext } from 'react'
import type { User } from '../../shared/api/session.ts'
import { type Action, can } from '../../shared/domain/access.ts'

/** Who is signed in; the shell provides it around every page behind the wall. */
export const UserContext = createContext<User | undefined>(undefined)

export function useUser(): User {
  const user = useContext(UserContext)
  if (!user) throw new Error('used outside the signed-in pages')
  return user
}

/** May the person do this? The same table as on the server. */
export function useCan(action: Action): boolean {
  return can(useUser().role, action)
}
