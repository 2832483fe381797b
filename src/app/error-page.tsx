import { Link, isRouteErrorResponse, useRouteError } from 'react-router'
import { AppError } from '../../shared/api/errors.ts'
import { sentenceOf } from '../lib/api.ts'
import { paths } from '../lib/paths.ts'
import { Page } from '../ui/page.tsx'

function missing(error: unknown): boolean {
  return (isRouteErrorResponse(error) && error.status === 404) || (error instanceof AppError && error.code === 'not-found')
}

/** Nothing here, or something broke: what happened and where to go. */
export function ErrorPage() {
  const error = useRouteError()
  const nothing = missing(error)
  return (
    <Page title={nothing ? 'Nothing here' : 'This page cannot be shown'}>
      <p className="mb-3">{nothing ? 'The address leads nowhere, or to something that is not yours to see.' : sentenceOf(error)}</p>
      <Link className="text-resin underline" to={paths.home}>
        Go to the start
      </Link>
    </Page>
  )
}

export function NothingHere() {
  return (
    <Page title="Nothing here">
      <p className="mb-3">The address leads nowhere, or to something that is not yours to see.</p>
      <Link className="text-resin underline" to={paths.home}>
        Go to the start
      </Link>
    </Page>
  )
}
