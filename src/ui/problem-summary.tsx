import { useEffect, useRef, useState } from 'react'

const fieldNamed = (name: string) => document.querySelector<HTMLInputElement>(`[name="${CSS.escape(name)}"]`)
/** The label of the field, so that a message that many fields may have tells which one it is about. */
const labelOf = (name: string) => fieldNamed(name)?.labels?.[0]?.textContent ?? ''

interface ProblemSummaryProps {
  problems: { fields: Record<string, string>; summary: string | undefined }
}

/** What is wrong with a form, on top of it; takes focus, and each line leads to its field (an input whose `name` is the field's address). */
export function ProblemSummary({ problems }: ProblemSummaryProps) {
  const box = useRef<HTMLDivElement>(null)
  const entries = Object.entries(problems.fields)
  const any = entries.length > 0 || problems.summary !== undefined
  const [labels, setLabels] = useState<Record<string, string>>({})
  useEffect(() => {
    if (any) box.current?.focus()
    setLabels(Object.fromEntries(Object.keys(problems.fields).map((name) => [name, labelOf(name)])))
  }, [any, problems])
  if (!any) return null
  const goTo = (name: string) => fieldNamed(name)?.focus()
  return (
    <div ref={box} tabIndex={-1} role="alert" className="mb-4 border-2 border-stop bg-card p-4">
      <h2 className="text-section">There is a problem</h2>
      {problems.summary && <p className="mt-1">{problems.summary}</p>}
      <ul className="mt-1">
        {entries.map(([name, message]) => (
          <li key={name}>
            <button type="button" className="text-left font-semibold text-stop underline" onClick={() => goTo(name)}>
              {labels[name] ? `${labels[name]}: ${message}` : message}
            </button>
          </li>
        ))}
      </ul>
    </div>
  )
}
