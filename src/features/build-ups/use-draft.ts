import { useEffect, useMemo, useReducer, useState } from 'react'
import type { BuildUp } from '../../../shared/api/build-ups.ts'
import type { EvaluationInput } from '../../../shared/domain/build-up.ts'
import { evaluate } from '../../../shared/domain/evaluate.ts'
import { useMoreFacts, useSaveDraft } from './queries.ts'
import { useAutosave } from './use-autosave.ts'
import { type Work, historyOf, reduce } from './work.ts'

const workOf = ({ opened }: BuildUp): Work => ({ courses: opened.input.courses, conditions: opened.input.conditions })
const savedOf = (buildUp: BuildUp) => ({ work: workOf(buildUp), version: buildUp.opened.version, at: buildUp.opened.updatedAt })

/** What the work rests on: the facts it was loaded with and those fetched for what was chosen since. */
function useInput(buildUp: BuildUp, work: Work): { input: EvaluationInput; fetching: boolean } {
  const { input: loaded } = buildUp.opened
  const mixes = work.courses.flatMap(({ mixId }) => (mixId && !loaded.mixes[mixId] ? [mixId] : []))
  const products = work.courses.flatMap(({ filler, broadcast }) =>
    [filler, broadcast].flatMap((sand) => (sand && !loaded.products[sand.productId] ? [sand.productId] : [])),
  )
  const more = useMoreFacts({ mixes: [...new Set(mixes)], products: [...new Set(products)] })
  const input = useMemo(
    () => ({
      ...loaded,
      ...work,
      mixes: { ...more.data?.mixes, ...loaded.mixes },
      products: { ...more.data?.products, ...loaded.products },
    }),
    [loaded, work, more.data],
  )
  return { input, fetching: more.isFetching }
}

/** A draft at work: its steps, what it is reckoned from and comes to, and how it is kept. */
export function useDraft(buildUp: BuildUp) {
  const [history, dispatch] = useReducer(reduce, workOf(buildUp), historyOf)
  const work = history.present
  const { input, fetching } = useInput(buildUp, work)
  const evaluation = useMemo(() => evaluate(input), [input])
  const save = useSaveDraft({ buildUpId: buildUp.id, number: buildUp.opened.number })
  const [first] = useState(work)
  const autosave = useAutosave({ work, loaded: { ...savedOf(buildUp), work: first }, save })

  const { adopt, version, dirty } = autosave
  const load = (theirs: BuildUp) => {
    const saved = savedOf(theirs)
    dispatch({ kind: 'load', work: saved.work })
    adopt(saved)
  }
  useEffect(() => {
    if (dirty || buildUp.opened.version <= version()) return
    const saved = savedOf(buildUp)
    dispatch({ kind: 'load', work: saved.work })
    adopt(saved)
  }, [buildUp, dirty, version, adopt])

  return { work, history, dispatch, input, fetching, evaluation, autosave, load }
}
export type Draft = ReturnType<typeof useDraft>
