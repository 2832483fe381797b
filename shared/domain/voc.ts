/** VOC of what is mixed, per part. Masses in grams, volumes in litres. */
export interface VocPart {
  /** Volatile organic compounds, g, without water and exempt compounds. */
  voc: number
  volume: number
  water: number
  exempt: number
}

/**
 * VOC content, g/L, less water and exempt compounds: Σ VOC ÷ (Σ V − Σ water − Σ exempt).
 * The content of a mix is worked out from its masses, never averaged from the contents of its parts.
 * Source: 40 CFR 59.406(a)(1), from memory.
 */
export function vocLessWater(parts: readonly VocPart[]): number {
  const sum = (key: keyof VocPart) => parts.reduce((total, part) => total + part[key], 0)
  return sum('voc') / (sum('volume') - sum('water') - sum('exempt'))
}

/** VOC content, g/L, of the whole: Σ VOC ÷ Σ V. */
export function vocActual(parts: readonly VocPart[]): number {
  const total = (key: keyof VocPart) => parts.reduce((sum, part) => sum + part[key], 0)
  return total('voc') / total('volume')
}
