import { hazardStatements, joinedHazardStatements, supplementalStatements } from './ghs-hazards.ts'
import { joinedPrecautions, laterPrecautions, precautionaryStatements } from './ghs-precautions.ts'

/** The edition that the statements follow; see ghs-hazards.ts and ghs-precautions.ts for what each is held against. */
export const ghsEdition = 'UN GHS / CLP wording before 2019, UK spelling'

const statements: Readonly<Record<string, string>> = {
  ...hazardStatements,
  ...joinedHazardStatements,
  ...supplementalStatements,
  ...precautionaryStatements,
  ...laterPrecautions,
  ...joinedPrecautions,
}
const said = (code: string) => (Object.hasOwn(statements, code) ? statements[code] : undefined)

/** Every code that has a statement of its own here. */
export const ghsCodes: readonly string[] = Object.keys(statements)

/**
 * The official statement of a code; joined codes (`P305+P351+P338`) read as their parts do, one after the other, unless they have a sentence of
 * their own (`H302+H332`). Undefined for a code that is not in the list: then the code alone is shown.
 */
export function ghsStatement(code: string): string | undefined {
  const whole = said(code)
  if (whole) return whole
  const parts = code.split('+').map(said)
  return parts.every((part) => part !== undefined) ? parts.join(' ') : undefined
}

/** Pictograms of the standard by code, with what each shows and stands for. Source: UN GHS Annex 1, from memory. */
export const pictograms = {
  GHS01: { shows: 'exploding bomb', means: 'explosive' },
  GHS02: { shows: 'flame', means: 'flammable' },
  GHS03: { shows: 'flame over circle', means: 'oxidising' },
  GHS04: { shows: 'gas cylinder', means: 'gas under pressure' },
  GHS05: { shows: 'corrosion', means: 'corrosive' },
  GHS06: { shows: 'skull and crossbones', means: 'acutely toxic' },
  GHS07: { shows: 'exclamation mark', means: 'harmful, irritant or skin sensitiser' },
  GHS08: { shows: 'health hazard', means: 'serious hazard to health' },
  GHS09: { shows: 'environment', means: 'hazardous to the aquatic environment' },
} as const
export type PictogramCode = keyof typeof pictograms

const codesOf = (lists: Record<string, string>) =>
  Object.entries(lists).flatMap(([name, codes]) => codes.split(' ').map((code) => [code, name] as const))

const pictogramCodes: Record<PictogramCode, string> = {
  GHS01: 'H200 H201 H202 H203 H204 H240 H241',
  GHS02: 'H206 H207 H208 H220 H222 H223 H224 H225 H226 H228 H230 H231 H232 H241 H242 H250 H251 H252 H260 H261',
  GHS03: 'H270 H271 H272',
  GHS04: 'H280 H281',
  GHS05: 'H290 H314 H318',
  GHS06: 'H300 H301 H310 H311 H330 H331',
  GHS07: 'H302 H312 H315 H317 H319 H332 H335 H336 H420',
  GHS08: 'H304 H334 H340 H341 H350 H350i H351 H360 H360F H360D H360FD H360Fd H360Df H361 H361f H361d H361fd H370 H371 H372 H373',
  GHS09: 'H400 H410 H411',
}
const pictogramsByCode = new Map<string, PictogramCode[]>()
for (const [code, pictogram] of codesOf(pictogramCodes) as (readonly [string, PictogramCode])[]) {
  pictogramsByCode.set(code, [...(pictogramsByCode.get(code) ?? []), pictogram])
}
const noPictogram: readonly PictogramCode[] = []

/** Pictograms that a single hazard statement's class calls for, before precedence; most call for one, some for none. Source: UN GHS Annex 1, from memory. */
export function pictogramsOfStatement(code: string): readonly PictogramCode[] {
  return pictogramsByCode.get(code) ?? noPictogram
}

const signalWords = new Map<string, string>(
  codesOf({
    Danger:
      'H200 H201 H202 H203 H205 H206 H220 H222 H224 H225 H230 H231 H232 H240 H241 H250 H251 H260 H270 H271 H300 H301 H304 H310 H311 H314 H318 H330 H331 H334 H340 H350 H350i H360 H360F H360D H360FD H360Fd H360Df H370 H372',
    Warning:
      'H204 H208 H221 H223 H226 H227 H229 H252 H280 H281 H290 H302 H303 H305 H312 H313 H315 H316 H317 H319 H320 H332 H333 H335 H336 H341 H351 H361 H361f H361d H361fd H371 H373 H400 H410 H420',
  }),
)

/**
 * Signal word that a single hazard statement's class calls for; undefined where the code alone does not tell (H207, H228, H242, H261, H272 come with either)
 * or where none is called for (H401, H402, H411–H413). Source: UN GHS Annex 1, from memory.
 */
export function signalWordOfStatement(code: string): 'Danger' | 'Warning' | undefined {
  return signalWords.get(code) as 'Danger' | 'Warning' | undefined
}
