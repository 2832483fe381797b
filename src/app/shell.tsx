import { useMutation, useQueryClient } from '@tanstack/react-query'
import { useEffect, useState } from 'react'
import { Link, NavLink, Navigate, Outlet, ScrollRestoration, useLocation, useNavigate } from 'react-router'
import { type Action, can } from '../../shared/domain/access.ts'
import { sentenceOf } from '../lib/api.ts'
import { paths } from '../lib/paths.ts'
import { UserContext } from '../lib/user.ts'
import { signOut, useWho } from '../features/people/queries.ts'
import { Asking } from '../ui/asking.tsx'
import { unitSystemNames, useUnitSystem } from '../ui/unit-system.tsx'

const places: { to: string; name: string; action: Action }[] = [
  { to: paths.products, name: 'Products', action: 'catalogue:read' },
  { to: paths.mixes, name: 'Mixes', action: 'catalogue:read' },
  { to: paths.sheets, name: 'Sheets', action: 'sheet:list' },
  { to: paths.buildUps, name: 'Build-ups', action: 'build-up:read' },
  { to: paths.jobs, name: 'Jobs', action: 'job:read' },
  { to: paths.siteCards, name: 'Site cards', action: 'site-card:read' },
  { to: paths.people, name: 'People', action: 'people:manage' },
]
const roleNames = { lead: 'technical lead', estimator: 'estimator', crew: 'crew' } as const

/** The frame around every page behind the wall: where one can go, who one is. */
export function Shell() {
  const who = useWho()
  const location = useLocation()
  if (who.data === null) return <Navigate to={`${paths.signIn}?to=${encodeURIComponent(location.pathname + location.search)}`} replace />
  return (
    <Asking query={who} says={sentenceOf}>
      {(user) =>
        user && (
          <UserContext value={user}>
            <a href="#main" className="sr-only focus:not-sr-only focus:absolute focus:bg-card focus:p-2">
              Skip to the page
            </a>
            <header className="no-print border-b border-rule bg-card">
              <div className="mx-auto flex max-w-[1400px] flex-wrap items-baseline gap-x-6 gap-y-1 px-4 py-3 md:px-7">
                <Link to={paths.home} className="text-section font-bold">
                  Wearcourse
                </Link>
                <Places allowed={places.filter((place) => can(user.role, place.action))} />
                <UnitSwitch />
                <span className="flex items-baseline gap-3 text-pencil">
                  <Link to={paths.account} className="hover:text-ink">
                    {user.name}, {roleNames[user.role]}
                  </Link>
                  <SignOut />
                </span>
              </div>
            </header>
            <ScrollRestoration />
            <FocusOnSearch />
            <Outlet />
          </UserContext>
        )
      }
    </Asking>
  )
}

function Places({ allowed }: { allowed: typeof places }) {
  const [open, setOpen] = useState(false)
  const location = useLocation()
  useEffect(() => setOpen(false), [location.pathname])
  return (
    <>
      <button
        type="button"
        className="min-h-9 border border-rule px-3 md:hidden"
        aria-expanded={open}
        aria-controls="places"
        onClick={() => setOpen(!open)}
      >
        Menu
      </button>
      <nav
        id="places"
        aria-label="Main"
        className={`${open ? 'flex' : 'hidden'} w-full flex-col gap-1 md:flex md:w-auto md:flex-1 md:flex-row md:gap-5`}
      >
        {allowed.map((place) => (
          <NavLink
            key={place.to}
            to={place.to}
            className={({ isActive }) =>
              `py-1 ${isActive ? 'border-b-2 border-resin text-ink' : 'border-b-2 border-transparent text-pencil hover:text-ink'}`
            }
          >
            {place.name}
          </NavLink>
        ))}
      </nav>
    </>
  )
}

function UnitSwitch() {
  const { system, next } = useUnitSystem()
  return (
    <button type="button" onClick={next} className="text-pencil hover:text-ink" title="Change the units shown (key u)">
      {unitSystemNames[system]}
    </button>
  )
}

function SignOut() {
  const client = useQueryClient()
  const navigate = useNavigate()
  const leave = useMutation({
    mutationFn: signOut,
    onSettled: async () => {
      await navigate(paths.signIn)
      client.clear()
    },
  })
  return (
    <button type="button" className="text-resin hover:underline" onClick={() => leave.mutate()}>
      Sign out
    </button>
  )
}

/** `/` goes to the page's search field. */
function FocusOnSearch() {
  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      if (event.key !== '/' || (event.target as HTMLElement).closest('input, textarea, select, [contenteditable]')) return
      const field = document.querySelector<HTMLElement>('input[type="search"]')
      if (!field) return
      event.preventDefault()
      field.focus()
    }
    window.addEventListener('keydown', onKey)
    return () => window.removeEventListener('keydown', onKey)
  }, [])
  return null
}
