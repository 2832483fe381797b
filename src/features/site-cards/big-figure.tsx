import type { Figure } from '../../../shared/domain/figure.ts'
import { formatFigure, formatRange, notStatedText } from '../../../shared/domain/format.ts'
import { CitationLink } from '../../ui/citation-link.tsx'

/** A figure to be read at arm's length: number large, unit beside it; not stated says so. */
export function BigFigure({ figure, large = true }: { figure: Figure; large?: boolean }) {
  if (figure.kind === 'not-stated') return <span className="font-semibold">{notStatedText}</span>
  const [, number = '', unit = ''] = /^(.*?\d)\s*([^\d]*)$/.exec(formatRange(figure.value)) ?? [undefined, formatFigure(figure), '']
  const shown = (
    <>
      <span className={large ? 'text-site-figure font-bold' : 'font-semibold'}>{number}</span> {unit}
    </>
  )
  return figure.kind === 'fact' && figure.origin.kind === 'stated' ? (
    <CitationLink citation={figure.origin.citation}>{shown}</CitationLink>
  ) : (
    <span>{shown}</span>
  )
}

/** Why a figure is missing, in the sheet's terms. */
export function WhyMissing({ figure }: { figure: Figure }) {
  if (figure.kind !== 'not-stated') return null
  const { because, ask } = figure.missing
  return (
    <span className="block text-body">
      {because ? `${because[0]?.toUpperCase()}${because.slice(1)}. ` : ''}Ask {ask}.
    </span>
  )
}
