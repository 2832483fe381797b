import { useState } from 'react'
import { Link } from 'react-router'
import { sentenceOf } from '../../lib/api.ts'
import { paths } from '../../lib/paths.ts'
import { Asking } from '../../ui/asking.tsx'
import { TextField } from '../../ui/field.tsx'
import { Notice, Page } from '../../ui/page.tsx'
import { useSiteCards } from './queries.ts'

/** The jobs whose card one may open, as large rows for a gloved hand. */
export function SiteCardsPage() {
  const [q, setQ] = useState('')
  const cards = useSiteCards(q)
  return (
    <Page title="Site cards">
      <div className="max-w-xl text-site">
        {(q !== '' || (cards.data?.total ?? 0) > 8) && (
          <TextField label="Search" type="search" value={q} onChange={(event) => setQ(event.target.value)} className="mb-4" />
        )}
        <Asking query={cards} says={sentenceOf}>
          {({ items }) =>
            items.length === 0 ? (
              <Notice>{q ? 'No site card matches.' : 'You are on no open job. The office puts people on jobs.'}</Notice>
            ) : (
              <ul className="grid gap-3">
                {items.map((card) => (
                  <li key={card.id}>
                    <Link
                      to={paths.siteCard(card.id)}
                      className="flex min-h-[72px] flex-col justify-center rounded-touch border-2 border-ink bg-card px-4 py-3"
                    >
                      <span className="font-semibold">{card.name}</span>
                      <span className="text-body text-pencil">{[card.site, `${card.bays} bays`].filter(Boolean).join(', ')}</span>
                    </Link>
                  </li>
                ))}
              </ul>
            )
          }
        </Asking>
      </div>
    </Page>
  )
}
