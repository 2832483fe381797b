import type { ReactNode } from 'react'
import type { Origin } from '../../shared/domain/fact.ts'
import type { Figure, Working } from '../../shared/domain/figure.ts'
import { formatFigure, formatRange, notStatedText } from '../../shared/domain/format.ts'
import { CitationLink } from './citation-link.tsx'
import { useUnitSystem } from './unit-system.tsx'

interface FigureViewProps {
  figure: Figure
  /** Shown instead of the plain range: a window or a value with its part. */
  text?: string
  /** Also say the condition the figure holds at. */
  withCondition?: boolean
}

/**
 * A figure with how it is known: stated opens its page (dotted underline), entered tells its reason, computed opens its sum,
 * typical says so, and what no sheet states says "not stated".
 */
export function FigureView({ figure, text, withCondition = false }: FigureViewProps) {
  const { system } = useUnitSystem()
  if (figure.kind === 'not-stated') {
    const { of, because, ask } = figure.missing
    return <Explained said={notStatedText} muted>{`${of}${because ? `: ${because}` : ''}. Ask ${ask}.`}</Explained>
  }
  const shown = text ?? formatFigure(figure, system)
  if (figure.kind === 'computed')
    return (
      <ComputedValue working={figure.working} from={figure.from}>
        {shown}
      </ComputedValue>
    )
  return (
    <>
      <OriginValue origin={figure.origin}>{shown}</OriginValue>
      {withCondition && figure.condition && <span className="text-pencil"> {figure.condition}</span>}
    </>
  )
}

/** A value of the catalogue with its origin. */
export function OriginValue({ origin, children }: { origin: Origin; children: ReactNode }) {
  if (origin.kind === 'stated') return <CitationLink citation={origin.citation}>{children}</CitationLink>
  if (origin.kind === 'typical')
    return (
      <span title={`${origin.source}, ${origin.dated}`}>
        {children} <em className="text-caution not-italic">typical, verify</em>
      </span>
    )
  return <Explained said={children}>{`Entered by ${origin.by}, ${origin.at.slice(0, 10)}: ${origin.reason}`}</Explained>
}

/** Words that tell more when they are opened, by pointer or by keyboard. */
function Explained({ said, muted = false, children }: { said: ReactNode; muted?: boolean; children: string }) {
  return (
    <details className="inline-block text-left align-top">
      <summary className={`cursor-pointer list-none [&::-webkit-details-marker]:hidden ${muted ? 'text-pencil' : ''}`} title={children}>
        {said}
      </summary>
      <span className="block max-w-72 text-small text-pencil">{children}</span>
    </details>
  )
}

type Sources = Extract<Figure, { kind: 'computed' }>['from']

function ComputedValue({ working, from, children }: { working: Working; from: Sources; children: ReactNode }) {
  return (
    <details className="inline-block text-left align-top">
      <summary
        className="cursor-pointer list-none text-right underline decoration-rule decoration-1 underline-offset-4 hover:decoration-ink [&::-webkit-details-marker]:hidden"
        title={working.sum}
      >
        {children}
      </summary>
      <span className="block max-w-80 border-l-2 border-rule py-1 pl-2 text-small">
        <span className="block text-pencil">{working.formula}</span>
        <span className="block">{working.sum}</span>
        {from.map((source) => (
          <span key={`${source.label} ${source.factId ?? ''}`} className="block">
            {source.origin?.kind === 'stated' ? (
              <CitationLink citation={source.origin.citation}>{source.label}</CitationLink>
            ) : (
              source.label
            )}
          </span>
        ))}
        <span className="block text-pencil">{working.source}</span>
      </span>
    </details>
  )
}

/** A plain quantity in the units a person chose. */
export function QuantityText({ value, unit }: { value: number; unit: Parameters<typeof formatRange>[0]['unit'] }) {
  const { system } = useUnitSystem()
  return <>{formatRange({ min: value, max: value, unit }, system)}</>
}
