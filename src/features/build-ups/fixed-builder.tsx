import { useMemo } from 'react'
import type { BuildUp } from '../../../shared/api/build-ups.ts'
import { evaluate } from '../../../shared/domain/evaluate.ts'
import { BuilderBody } from './builder-body.tsx'
import { BuilderFrame } from './builder-frame.tsx'
import { ConditionsSummary } from './conditions-summary.tsx'

const saved = () => Promise.resolve(true)

/** A version that no longer changes, with the facts and the result it was released with. */
export function FixedBuilder({ buildUp }: { buildUp: BuildUp }) {
  const { opened } = buildUp
  const { input } = opened
  const evaluation = useMemo(() => opened.evaluation ?? evaluate(input), [opened.evaluation, input])
  const work = { courses: input.courses, conditions: input.conditions }
  return (
    <BuilderFrame
      buildUp={buildUp}
      evaluation={evaluation}
      conditions={input.conditions}
      titles={Object.fromEntries(work.courses.map(({ id, title }) => [id, title]))}
      beforeLeaving={saved}
      version={() => opened.version}
    >
      <ConditionsSummary conditions={input.conditions} />
      <BuilderBody view={{ work, input, evaluation, dispatch: null, fields: {} }} version={opened} reasons={opened.releaseReasons} />
    </BuilderFrame>
  )
}
