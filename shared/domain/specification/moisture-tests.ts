import { formatNumber } from '../format.ts'
import { valueIn } from '../units.ts'
import type { Runs } from './document.ts'
import { type Floor, areaOf } from './floor.ts'
import { notStatedRun } from './runs.ts'

/** Probes of ASTM F2170 and kits of ASTM F1869: three for the first 1,000 ft², one more for each further 1,000 ft² begun. From memory, so "verify". */
export function moistureTests({ given, register }: Floor): Runs {
  const area = areaOf(given.bays)
  if (!area) return notStatedRun()
  const feet = valueIn(area, 'ft²')
  const count = 3 + Math.max(0, Math.ceil((feet - 1000) / 1000 - 1e-9))
  const sum = `${formatNumber(feet, 0)} ft²: 3 for the first 1,000 ft², then 1 for each further 1,000 ft² begun = ${count}`
  return [
    register.working(`${count} tests`, {
      formula: 'tests by area',
      sum,
      source: 'ASTM F2170 and F1869, from memory: verify in the edition in force',
    }),
  ]
}
