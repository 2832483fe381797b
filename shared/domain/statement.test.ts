import { describe, expect, it } from 'vitest'
import { type Property, propertyNames } from './property.ts'
import { type LooseStatement, statementProblems } from './statement.ts'

const of = (property: Property, value: unknown, more: Partial<LooseStatement> = {}): LooseStatement => ({
  property,
  part: 'mixed',
  value,
  ...more,
})
const wrongAt = (statement: LooseStatement) => statementProblems(statement).map(({ path }) => path.join('.'))

/** One value of each property as a sheet may state it. Invented, common for the trade. */
const sound: Record<Property, unknown> = {
  productName: { text: 'Ostrel 110 Clear' },
  revisionDate: { date: '2024-03' },
  mixRatio: { parts: [2, 1], basis: 'volume' },
  splitKit: { is: false },
  packSize: { min: 3, max: 3, unit: 'gal' },
  density: { min: 9.4, max: 9.4, unit: 'lb/gal' },
  viscosity: { min: 600, max: 900, unit: 'mPa·s' },
  volumeSolids: { min: 100, max: 100, unit: '%' },
  weightSolids: { min: 96, max: 100, unit: '%' },
  voc: { max: 0, unit: 'g/L' },
  inductionTime: { min: 5, max: 5, unit: 'min' },
  potLife: { min: 25, max: 30, unit: 'min' },
  workingTime: { min: 20, max: 20, unit: 'min' },
  recoatWindow: { min: 8, max: 24, unit: 'h' },
  tackFree: { min: 6, max: 6, unit: 'h' },
  footTraffic: { min: 12, max: 12, unit: 'h' },
  vehicleTraffic: { min: 48, max: 48, unit: 'h' },
  fullCure: { min: 7, max: 7, unit: 'd' },
  filmThickness: { min: 8, max: 20, unit: 'mil' },
  spreadRate: { min: 100, max: 160, unit: 'ft²/gal' },
  consumption: { min: 0.5, max: 1, unit: 'lb/ft²' },
  applicationTemperature: { min: -10, max: 90, unit: '°F' },
  maxRelativeHumidity: { max: 85, unit: '%' },
  dewPointMargin: { min: 5, unit: 'Δ°F' },
  substrateRelativeHumidity: { max: 85, unit: '%' },
  moistureEmission: { max: 5, unit: 'lb/1000 ft²·24 h' },
  surfaceProfile: { min: 2, max: 4, unit: 'CSP' },
  pullOffStrength: { min: 250, unit: 'psi' },
  shelfLife: { min: 12, max: 12, unit: 'month' },
  storageTemperature: { min: 50, max: 90, unit: '°F' },
  emergencyPhone: { text: '1-800-555-0141' },
  signalWord: { text: 'Danger' },
  hazardStatements: { codes: ['H314', 'H317'] },
  supplementalStatements: { codes: ['EUH205'] },
  precautionaryStatements: { codes: ['P280', 'P305+P351+P338'] },
  ingredient: { name: 'Benzyl alcohol', cas: '100-51-6', min: 10, max: 30, unit: '%' },
  flashPoint: { min: 93, unit: '°C' },
  gloves: { text: 'Butyl rubber, 0.5 mm' },
  eyeProtection: { text: 'Goggles' },
  respiratoryProtection: { text: 'Not needed with good air.' },
  unNumber: { text: 'UN2735' },
  properShippingName: { text: 'Amines, liquid, corrosive, n.o.s.' },
  transportClass: { text: '8' },
  packingGroup: { text: 'II' },
  packPrice: { min: 210, max: 210, unit: 'USD' },
}

describe('what a sheet can say', () => {
  it.each(propertyNames)('takes a value of %s as a sheet may state it', (property) => {
    expect(statementProblems(of(property, sound[property]))).toEqual([])
  })

  it.each(propertyNames)('takes for %s no value of another form, and no nothing', (property) => {
    for (const wrong of [
      undefined,
      null,
      7,
      'seven',
      [],
      {},
      { unit: 'mil' },
      { min: 1, max: 1, unit: 'N', more: 1 },
      { is: 'yes' },
      { parts: [1] },
    ]) {
      expect(wrongAt(of(property, wrong))[0], JSON.stringify(wrong)).toMatch(/^value/)
    }
  })

  it('names the field that is wrong', () => {
    expect(wrongAt(of('potLife', { min: 30, max: 25, unit: 'min' }))).toEqual(['value'])
    expect(wrongAt(of('potLife', { min: Number.NaN, unit: 'min' }))).toEqual(['value.min'])
    expect(wrongAt(of('potLife', { min: 1e10, unit: 'min' }))).toEqual(['value.min'])
    expect(wrongAt(of('potLife', { min: 25, max: 25, unit: 'mil' }))).toEqual(['value.unit'])
    expect(wrongAt(of('mixRatio', { parts: [2, 0] }))).toEqual(['value.parts.1'])
    expect(wrongAt(of('mixRatio', { parts: [2] }))).toEqual(['value.parts'])
    expect(wrongAt(of('gloves', { text: 'a\u0000b' }))).toEqual(['value.text'])
    expect(wrongAt(of('gloves', { text: 'a\ud800b' }))).toEqual(['value.text'])
    expect(wrongAt(of('gloves', { text: 'x'.repeat(2001) }))).toEqual(['value.text'])
  })

  it('takes nothing that cannot be', () => {
    expect(wrongAt(of('density', { min: -1, max: 2, unit: 'kg/L' }))).toEqual(['value.min'])
    expect(wrongAt(of('density', { min: 0, max: 0, unit: 'kg/L' }))).toEqual(['value.min', 'value.max'])
    expect(wrongAt(of('volumeSolids', { min: 100, max: 101, unit: '%' }))).toEqual(['value.max'])
    // ICRI 310.2R-2013 has the profiles CSP 1 to CSP 10
    expect(wrongAt(of('surfaceProfile', { min: 0, max: 11, unit: 'CSP' }))).toEqual(['value.min', 'value.max'])
    // Absolute zero is −459.67 °F
    expect(wrongAt(of('flashPoint', { min: -460, unit: '°F' }))).toEqual(['value.min'])
    expect(wrongAt(of('flashPoint', { min: -459, unit: '°F' }))).toEqual([])
    expect(wrongAt(of('recoatWindow', { min: 0, max: 4, unit: 'h' }))).toEqual([])
  })

  it('proves the check digit of a CAS number', () => {
    // 100-51-6: 1×1 + 5×2 + 0×3 + 0×4 + 1×5 = 16, 16 mod 10 = 6 (CAS, check digit verification, from memory)
    expect(wrongAt(of('ingredient', { name: 'Benzyl alcohol', cas: '100-51-7', unit: '%' }))).toEqual(['value.cas'])
    expect(wrongAt(of('ingredient', { name: 'Benzyl alcohol', cas: '100516', unit: '%' }))).toEqual(['value.cas'])
    expect(wrongAt(of('ingredient', { name: 'Benzyl alcohol', min: 30, max: 10, unit: '%' }))).toEqual(['value.min'])
  })

  it('keeps the families of codes apart', () => {
    expect(wrongAt(of('hazardStatements', { codes: ['H315', 'EUH205'] }))).toEqual(['value.codes'])
    expect(wrongAt(of('supplementalStatements', { codes: ['H315'] }))).toEqual(['value.codes'])
    expect(wrongAt(of('precautionaryStatements', { codes: ['H315'] }))).toEqual(['value.codes'])
    expect(wrongAt(of('hazardStatements', { codes: ['H315', 'H315'] }))).toEqual(['value.codes'])
    expect(wrongAt(of('hazardStatements', { codes: ['315'] }))).toEqual(['value.codes.0'])
  })

  it('holds words that a standard sets against it', () => {
    expect(wrongAt(of('signalWord', { text: 'Caution' }))).toEqual(['value.text'])
    expect(wrongAt(of('unNumber', { text: '2735' }))).toEqual(['value.text'])
    expect(wrongAt(of('packingGroup', { text: '2' }))).toEqual(['value.text'])
  })

  it('knows the days of the calendar', () => {
    // Gregorian: 2000 and 2024 are leap years, 1900 and 2023 are not
    for (const date of ['2024-02-29', '2000-02-29', '2024', '2024-12']) expect(wrongAt(of('revisionDate', { date })), date).toEqual([])
    for (const date of ['2023-02-29', '1900-02-29', '2024-04-31', '2024-13', '18.3.2024', '']) {
      expect(wrongAt(of('revisionDate', { date })), date).toEqual(['value.date'])
    }
  })

  it('asks each condition in its own units, and only what a property can say beside its value', () => {
    const potLife = (at: LooseStatement['at']) => wrongAt(of('potLife', sound.potLife, { at }))
    expect(
      potLife({ temperature: { value: 75, unit: '°F' }, mass: { value: 150, unit: 'g' }, relativeHumidity: { value: 50, unit: '%' } }),
    ).toEqual([])
    expect(potLife({ temperature: { value: 75, unit: 'mil' } })).toEqual(['at.temperature.value'])
    expect(potLife({ mass: { value: -1, unit: 'g' }, relativeHumidity: { value: 101, unit: '%' } })).toEqual([
      'at.mass.value',
      'at.relativeHumidity.value',
    ])
    expect(wrongAt(of('potLife', sound.potLife, { part: 'A' }))).toEqual(['part'])
    expect(wrongAt(of('density', sound.density, { part: 'A' }))).toEqual([])
    expect(wrongAt(of('potLife', sound.potLife, { film: 'wet', of: 'slab', thinned: true }))).toEqual(['film', 'of', 'thinned'])
    expect(wrongAt(of('filmThickness', sound.filmThickness, { film: 'wet' }))).toEqual([])
  })
})
