import { Navigate } from 'react-router'
import { can } from '../../shared/domain/access.ts'
import { paths } from '../lib/paths.ts'
import { useUser } from '../lib/user.ts'

/** Everyone starts at their own work: the office at the build-ups, the crew at its site cards. */
export function Home() {
  return <Navigate replace to={can(useUser().role, 'build-up:read') ? paths.buildUps : paths.siteCards} />
}
