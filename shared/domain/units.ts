import configureMeasurements from 'convert-units'

/**
 * Units of the trade, by dimension, each with its exact factor to the SI unit of that dimension.
 * Sources: international yard and pound 1959 (in = 25.4 mm, lb = 453.59237 g), US gallon = 231 in³, all exact by definition.
 */
const inch = 0.0254
const foot = 12 * inch
const pound = 0.45359237
const gallon = 231 * inch ** 3
const squareFoot = foot ** 2
/** 1 lbf = 1 lb × standard gravity 9.80665 m/s² (exact). */
const psi = (pound * 9.80665) / inch ** 2

const factors = {
  /** metre */
  length: { µm: 1e-6, mm: 1e-3, m: 1, mil: inch / 1000, in: inch, ft: foot },
  /** square metre */
  area: { 'm²': 1, 'ft²': squareFoot },
  /** cubic metre */
  volume: { mL: 1e-6, L: 1e-3, 'm³': 1, gal: gallon, 'in³': inch ** 3 },
  /** kilogram; `oz` is the avoirdupois ounce */
  mass: { g: 1e-3, kg: 1, lb: pound, oz: pound / 16 },
  /** kilogram per cubic metre; serves density, VOC content and aggregate per liquid volume */
  density: { 'g/L': 1, 'kg/L': 1000, 'g/cm³': 1000, 'lb/gal': pound / gallon, 'lb/ft³': pound / foot ** 3 },
  /** square metre per cubic metre */
  spread: { 'm²/L': 1000, 'ft²/gal': squareFoot / gallon },
  /** kilogram per square metre */
  consumption: { 'kg/m²': 1, 'g/m²': 1e-3, 'lb/ft²': pound / squareFoot },
  /** second */
  time: { s: 1, min: 60, h: 3600, d: 86400, week: 604800 },
  /** kelvin, as a difference: 5 Δ°F is 2.78 Δ°C, never a temperature */
  temperatureDifference: { 'Δ°C': 1, 'Δ°F': 5 / 9 },
  /** pascal */
  pressure: { MPa: 1e6, psi },
  /** newton; 1 lbf is the weight of 1 lb at standard gravity */
  force: { N: 1, kN: 1e3, lbf: pound * 9.80665 },
  /** pascal second */
  viscosity: { 'mPa·s': 1e-3 },
  /** kilogram per square metre and second */
  emission: { 'lb/1000 ft²·24 h': pound / (1000 * squareFoot * 86400), 'g/m²·24 h': 1e-3 / 86400 },
  /** fraction */
  fraction: { '%': 0.01 },
  /** calendar months have no fixed length in days */
  calendar: { month: 1 },
  /** concrete surface profile number of ICRI 310.2R: a class, not a measure */
  profile: { CSP: 1 },
  /** the firm's currency */
  money: { USD: 1 },
} as const

type TemperatureUnit = '°C' | '°F'
export type Dimension = keyof typeof factors | 'temperature'
export type UnitOf<D extends Dimension> = D extends keyof typeof factors ? keyof (typeof factors)[D] & string : TemperatureUnit
export type Unit = { [D in Dimension]: UnitOf<D> }[Dimension]

/** A number with the unit it was stated in. Two units of one dimension are two types: mils and micrometres do not mix. */
export interface Quantity<U extends Unit = Unit> {
  readonly value: number
  readonly unit: U
}

const measures = Object.fromEntries(
  Object.entries(factors).map(([dimension, units]) => [
    dimension,
    {
      systems: {
        trade: Object.fromEntries(
          Object.entries(units).map(([unit, factor]) => [unit, { name: { singular: unit, plural: unit }, to_anchor: factor }]),
        ),
      },
    },
  ]),
)
/** °C = (5 °F − 160) / 9, kept in whole numbers so that 50 °F is exactly 10 °C. */
const temperature = {
  systems: {
    trade: {
      '°C': { name: { singular: '°C', plural: '°C' }, to_anchor: 9 },
      '°F': { name: { singular: '°F', plural: '°F' }, to_anchor: 5, anchor_shift: 160 },
    },
  },
}
const converter = configureMeasurements<string, string, string>({ ...measures, temperature })

const dimensionByUnit = new Map<string, Dimension>([
  ['°C', 'temperature'],
  ['°F', 'temperature'],
  ...Object.entries(factors).flatMap(([dimension, units]) => Object.keys(units).map((unit) => [unit, dimension as Dimension] as const)),
])

/** Every unit, in the order of the dimensions. */
export const units = [...dimensionByUnit.keys()] as [Unit, ...Unit[]]

/** The dimension a unit measures. */
export function dimensionOf(unit: Unit): Dimension {
  const dimension = dimensionByUnit.get(unit)
  if (!dimension) throw new RangeError(`unknown unit ${unit}`)
  return dimension
}

/** The units of a dimension, in the order shown to people. */
export function unitsOf<D extends Dimension>(dimension: D): UnitOf<D>[] {
  return units.filter((unit) => dimensionOf(unit) === dimension) as UnitOf<D>[]
}

/** A quantity in one of its units. */
export function quantity<U extends Unit>(value: number, unit: U): Quantity<U> {
  return { value, unit }
}

const scales = new Map<string, number>()

/** Read off the converter once per pair of units and kept: a build-up is evaluated on every keystroke. */
function scaleBetween(from: Unit, to: Unit): number {
  const key = `${from}>${to}`
  let scale = scales.get(key)
  if (scale === undefined) {
    scale = converter(1).from(from).to(to)
    scales.set(key, scale)
  }
  return scale
}

/**
 * The same quantity in another unit of its dimension. Not rounded.
 * @throws RangeError when the units measure different things.
 */
export function convert<U extends Unit>(from: Quantity, to: U): Quantity<U> {
  if (from.unit === to) return { value: from.value, unit: to }
  if (dimensionOf(from.unit) !== dimensionOf(to)) throw new RangeError(`${from.unit} and ${to} measure different things`)
  if (dimensionOf(to) === 'temperature') return { value: converter(from.value).from(from.unit).to(to), unit: to }
  return { value: from.value * scaleBetween(from.unit, to), unit: to }
}

/** The bare number of a quantity in a given unit. */
export function valueIn(from: Quantity, unit: Unit): number {
  return convert(from, unit).value
}

/** Sum of two quantities of the same unit; other units do not compile. */
export function add<U extends Unit>(a: Quantity<U>, b: Quantity<NoInfer<U>>): Quantity<U> {
  return { value: a.value + b.value, unit: a.unit }
}
