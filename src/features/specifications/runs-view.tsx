import { Fragment } from 'react'
import { type Run, tagText } from '../../../shared/domain/specification/document.ts'
import { CitationLink } from '../../ui/citation-link.tsx'

/** A line: stated figures open the sheet's page, tags lead to the tables at the end. */
export function RunsView({ runs }: { runs: readonly Run[] }) {
  return runs.map((run, index) => {
    if (run.kind !== 'figure') return <Fragment key={index}>{run.text}</Fragment>
    const figure = run.known === 'not-stated' ? <em className="text-pencil">{run.text}</em> : run.text
    const [tag] = run.tags
    return (
      <Fragment key={index}>
        {run.citation ? <CitationLink citation={run.citation}>{figure}</CitationLink> : figure}
        {tag && (
          <>
            {' '}
            <a
              href={`#${tag}`}
              className="inline-block min-h-6 text-small text-pencil underline decoration-rule underline-offset-2 hover:text-resin"
            >
              {tagText(run).trim()}
            </a>
          </>
        )}
      </Fragment>
    )
  })
}
