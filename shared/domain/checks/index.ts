import type { Finding } from '../finding.ts'
import { dewPointMarginKept, temperatureInRange } from './ambient.ts'
import { type Check, type Floor, findingsOf } from './check.ts'
import { filmInRange } from './film.ts'
import { ratioBasesAgree } from './mixing.ts'
import { moistureLimit } from './moisture.ts'
import { prepReachesProfile, profileForFilm } from './profile.ts'
import { sheetCurrent, sheetPresent } from './sheets.ts'
import { vocLimit } from './voc.ts'
import { windowCloses, windowOpens } from './window.ts'

/** The table of all checks. Builder, specification and site card read the same findings. */
export const checks = [
  profileForFilm,
  prepReachesProfile,
  filmInRange,
  windowOpens,
  windowCloses,
  ratioBasesAgree,
  temperatureInRange,
  dewPointMarginKept,
  moistureLimit,
  vocLimit,
  sheetPresent,
  sheetCurrent,
] as const satisfies readonly Check[]

const order = { stop: 0, caution: 1, unknown: 2, met: 3 } as const

/** All findings on a floor, stops first. */
export function runChecks(floor: Floor): Finding[] {
  return checks.flatMap((check) => findingsOf(check, floor)).sort((a, b) => order[a.status] - order[b.status])
}
