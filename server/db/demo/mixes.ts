import { type PrintedValue, type TemperatureRow, range, ratio, split } from './printed.ts'

/** An invented mix of the demo, with what its data sheet says, in the order it is printed. */
export interface DemoMix {
  name: string
  maker: 'Ostrel' | 'Teasel' | 'Corbel'
  chemistry: 'epoxy' | 'polyurethane' | 'polyurea' | 'polyaspartic' | 'urethane cement' | 'other mineral'
  color: string
  parts: string[]
  use: string
  dated: string
  values: PrintedValue[]
  table?: { degree: '°F' | '°C'; temperatures: number[]; rows: TemperatureRow[] }
  /** USD a kit, the firm's own. */
  price: number
}

const us = (rows: TemperatureRow[]) => ({ degree: '°F' as const, temperatures: [50, 70, 90], rows })
const si = (rows: TemperatureRow[]) => ({ degree: '°C' as const, temperatures: [10, 20, 30], rows })
const gallon = { value: 1, unit: 'gal' } as const
const kilogram = { value: 1, unit: 'kg' } as const
type Cells = TemperatureRow['cells']
const pot = (cells: Cells, rest: Partial<TemperatureRow> = { volume: gallon }): TemperatureRow => ({
  property: 'potLife',
  label: 'Pot life',
  unit: 'min',
  cells,
  ...rest,
})
const work = (cells: Cells): TemperatureRow => ({ property: 'workingTime', label: 'Working time on the floor', unit: 'min', cells })
const recoat = (cells: Cells): TemperatureRow => ({ property: 'recoatWindow', label: 'Next coat', unit: 'h', cells })
const foot = (cells: Cells): TemperatureRow => ({ property: 'footTraffic', label: 'Foot traffic', unit: 'h', cells })
const wheels = (cells: Cells): TemperatureRow => ({ property: 'vehicleTraffic', label: 'Vehicles', unit: 'h', cells })
const cure = (cells: Cells): TemperatureRow => ({ property: 'fullCure', label: 'Full cure', unit: 'd', cells })
const climate = (low: number, high: number, humidity = 85): PrintedValue[] => [
  range('applicationTemperature', 'Air and slab', [low, high, '°F']),
  range('maxRelativeHumidity', 'Humidity of the air', [null, humidity, '%']),
  range('dewPointMargin', 'Slab above the dew point', [5, null, 'Δ°F']),
]
const climateC = (low: number, high: number, humidity = 80): PrintedValue[] => [
  range('applicationTemperature', 'Air and floor', [low, high, '°C']),
  range('maxRelativeHumidity', 'Humidity of the air', [null, humidity, '%']),
  range('dewPointMargin', 'Floor above the dew point', [3, null, 'Δ°C']),
]
const kit = (size: number, unit: 'gal' | 'kg') => range('packSize', 'Kit', [size, size, unit])
const solids = (percent: number) => range('volumeSolids', 'Solids by volume', [percent, percent, '%'])
const voc = (grams: number) => range('voc', 'VOC, mixed', [null, grams, 'g/L'])
const shelf = (months: number) => range('shelfLife', 'Shelf life', [months, months, 'month'])
const bond = (psi: number) => range('pullOffStrength', 'Bond to concrete', [psi, null, 'psi'])

export const demoMixes: DemoMix[] = [
  {
    name: 'Ostrel 110 Clear',
    maker: 'Ostrel',
    chemistry: 'epoxy',
    color: '#8f9a98',
    parts: ['Ostrel 110 Clear, Part A', 'Ostrel 110 Clear, Part B'],
    use: 'Clear epoxy for priming and thin coats',
    dated: '2026-03-02',
    price: 186,
    values: [
      ratio('Mix ratio A : B', [2, 1], 'volume'),
      split(true),
      solids(100),
      voc(12),
      range('density', 'Density, mixed', [9.07, 9.07, 'lb/gal']),
      range('filmThickness', 'Film per coat', [8, 12, 'mil', { film: 'wet' }]),
      range('spreadRate', 'Coverage', [160, 160, 'ft²/gal', { at: { film: { value: 10, unit: 'mil' } }, after: 'at 10 mils' }]),
      ...climate(50, 90),
      range('substrateRelativeHumidity', 'Moisture in the slab, ASTM F2170', [null, 80, '%']),
      range('surfaceProfile', 'Profile', [2, 6, 'CSP']),
      bond(400),
      kit(3, 'gal'),
      shelf(24),
    ],
    table: us([
      pot([52, 32, 16]),
      work([60, 40, 22]),
      recoat([
        [16, 60],
        [9, 38],
        [5, 20],
      ]),
      foot([26, 14, 8]),
      wheels([96, 60, 36]),
      cure([10, 7, 5]),
    ]),
  },
  {
    name: 'Ostrel 115 Slurry',
    maker: 'Ostrel',
    chemistry: 'epoxy',
    color: '#c9b48a',
    parts: ['Ostrel 115 Slurry Binder, Part A', 'Ostrel 115 Slurry Binder, Part B'],
    use: 'Epoxy binder for sand-filled slurries',
    dated: '2025-06-16',
    price: 171,
    values: [
      ratio('Mix ratio A : B', [2, 1], 'volume'),
      split(false),
      solids(100),
      voc(10),
      range('density', 'Density, mixed', [9.13, 9.13, 'lb/gal']),
      range('filmThickness', 'Thickness, filled', [60, 250, 'mil', { film: 'wet' }]),
      ...climate(50, 90),
      range('substrateRelativeHumidity', 'Moisture in the slab, ASTM F2170', [null, 85, '%']),
      range('moistureEmission', 'Moisture emission, ASTM F1869', [null, 5, 'lb/1000 ft²·24 h']),
      range('surfaceProfile', 'Profile', [4, 7, 'CSP']),
      kit(3, 'gal'),
      shelf(24),
    ],
    table: us([
      pot([40, 22, 12]),
      recoat([
        [22, 48],
        [12, 30],
        [7, 18],
      ]),
      foot([30, 16, 9]),
      cure([10, 7, 5]),
    ]),
  },
  {
    name: 'Ostrel 140 Damp Primer',
    maker: 'Ostrel',
    chemistry: 'epoxy',
    color: '#a9a08d',
    parts: ['Ostrel 140 Damp Primer, Part A', 'Ostrel 140 Damp Primer, Part B'],
    use: 'Primer for slabs with moisture',
    dated: '2024-09-02',
    price: 224,
    values: [
      ratio('Mix ratio A : B', [2, 1], 'volume'),
      split(false),
      solids(100),
      voc(8),
      range('filmThickness', 'Film per coat', [8, 20, 'mil', { film: 'wet' }]),
      ...climate(50, 95),
      range('surfaceProfile', 'Profile', [3, 5, 'CSP']),
      range('substrateRelativeHumidity', 'Moisture in the slab', [null, 90, '%']),
      range('substrateRelativeHumidity', 'Moisture, thick coat', [
        null,
        99,
        '%',
        { at: { film: { value: 16, unit: 'mil' } }, after: 'from 16 mils' },
      ]),
      kit(3, 'gal'),
      shelf(18),
    ],
    table: us([
      pot([40, 25, 13]),
      recoat([
        [14, 48],
        [8, 24],
        [5, 14],
      ]),
      foot([24, 12, 7]),
      cure([9, 7, 5]),
    ]),
  },
  {
    name: 'Ostrel 220 Gloss, slate grey',
    maker: 'Ostrel',
    chemistry: 'epoxy',
    color: '#3f4a4d',
    parts: ['Ostrel 220 Gloss, Part A', 'Ostrel 220 Gloss, Part B'],
    use: 'Pigmented gloss top coat',
    dated: '2025-03-14',
    price: 238,
    values: [
      ratio('Mix ratio A : B', [2, 1], 'volume'),
      split(false),
      solids(100),
      voc(38),
      range('filmThickness', 'Film per coat', [8, 14, 'mil', { film: 'wet' }]),
      ...climate(55, 90),
      kit(3, 'gal'),
      shelf(18),
    ],
    table: us([
      pot([48, 28, 15]),
      work([50, 34, 20]),
      recoat([
        [18, 48],
        [10, 30],
        [6, 16],
      ]),
      foot([36, 24, 14]),
      wheels([120, 72, 48]),
      cure([12, 7, 5]),
    ]),
  },
  {
    name: 'Ostrel 310 Body',
    maker: 'Ostrel',
    chemistry: 'epoxy',
    color: '#7c8a7a',
    parts: ['Ostrel 310 Body, Part A', 'Ostrel 310 Body, Part B'],
    use: 'High-build body coat',
    dated: '2025-05-20',
    price: 262,
    values: [
      ratio('Mix ratio A : B', [3, 1], 'volume'),
      split(true),
      solids(98),
      voc(45),
      range('filmThickness', 'Film per coat', [12, 30, 'mil', { film: 'wet' }]),
      ...climate(50, 90),
      range('surfaceProfile', 'Profile', [3, 5, 'CSP']),
      kit(4, 'gal'),
      shelf(24),
    ],
    table: us([
      pot([45, 26, 14]),
      recoat([
        [18, null],
        [10, null],
        [6, null],
      ]),
      foot([30, 18, 10]),
      wheels([110, 66, 40]),
      cure([12, 7, 5]),
    ]),
  },
  {
    name: 'Ostrel 45 Water-borne',
    maker: 'Ostrel',
    chemistry: 'epoxy',
    color: '#b7b09c',
    parts: ['Ostrel 45 Water-borne, Part A', 'Ostrel 45 Water-borne, Part B'],
    use: 'Water-borne primer',
    dated: '2024-06-03',
    price: 142,
    values: [
      ratio('Mix ratio A : B', [1, 2], 'volume'),
      ratio('Mix ratio by scale', [100, 200], 'weight'),
      solids(48),
      voc(60),
      range('filmThickness', 'Film per coat', [4, 8, 'mil', { film: 'wet' }]),
      ...climate(55, 85, 75),
      kit(3, 'gal'),
    ],
    table: us([
      pot([120, 90, 45]),
      recoat([
        [12, 48],
        [6, 24],
        [4, 12],
      ]),
      foot([16, 8, 5]),
    ]),
  },
  {
    name: 'Teasel J8 Joint',
    maker: 'Teasel',
    chemistry: 'polyurea',
    color: '#5d6b6e',
    parts: ['Teasel J8 Joint, Part A', 'Teasel J8 Joint, Part B'],
    use: 'Semi-rigid filler for joints and cracks',
    dated: '2025-01-27',
    price: 24,
    values: [
      ratio('Mixing ratio A : B', [1, 1], 'volume'),
      solids(100),
      voc(5),
      range('density', 'Density, mixed', [1.07, 1.07, 'kg/L']),
      ...climateC(-5, 40, 90),
      range('packSize', 'Cartridge', [0.6, 0.6, 'L']),
      shelf(12),
    ],
    table: si([
      pot([7, 4, 2], {}),
      recoat([
        [2, 48],
        [1, 24],
        [0.5, 12],
      ]),
      foot([2, 1, 0.5]),
    ]),
  },
  {
    name: 'Teasel Seal 60',
    maker: 'Teasel',
    chemistry: 'polyurethane',
    color: '#d3d0c4',
    parts: ['Teasel Seal 60, Component A', 'Teasel Seal 60, Component B'],
    use: 'Light-fast matt top coat, solvent-borne',
    dated: '2025-04-08',
    price: 148,
    values: [
      ratio('Mixing ratio A : B', [4, 1], 'weight'),
      split(true),
      solids(55),
      voc(236),
      range('density', 'Density, mixed', [1.25, 1.25, 'kg/L']),
      range('filmThickness', 'Dry film per coat', [60, 75, 'µm', { film: 'dry' }]),
      ...climateC(8, 30),
      kit(10, 'kg'),
      shelf(12),
      range('surfaceProfile', 'Profile', [1, 3, 'CSP']),
      range('substrateRelativeHumidity', 'Moisture in the slab', [null, 75, '%']),
    ],
    table: si([
      pot([120, 80, 45], { mass: kilogram }),
      recoat([
        [18, 72],
        [10, 48],
        [6, 24],
      ]),
      foot([24, 14, 9]),
      wheels([120, 72, 48]),
      cure([12, 7, 5]),
    ]),
  },
  {
    name: 'Teasel Scald 6',
    maker: 'Teasel',
    chemistry: 'urethane cement',
    color: '#9c5f45',
    parts: ['Teasel Scald 6, Component A', 'Teasel Scald 6, Component B', 'Teasel Scald 6, Component C'],
    use: 'Urethane cement for hot wash-down',
    dated: '2025-06-11',
    price: 88,
    values: [
      ratio('Mixing ratio A : B : C', [1, 1, 6], 'weight'),
      split(false),
      range('filmThickness', 'Thickness', [4, 9, 'mm', { film: 'wet' }]),
      solids(100),
      range('density', 'Density, mixed', [1.95, 1.95, 'kg/L']),
      range('consumption', 'Consumption', [1.95, 1.95, 'kg/m²', { at: { film: { value: 1, unit: 'mm' } }, after: 'per mm' }]),
      ...climateC(5, 30),
      range('surfaceProfile', 'Profile', [5, 9, 'CSP']),
      range('substrateRelativeHumidity', 'Moisture in the slab', [null, 95, '%']),
      kit(32, 'kg'),
      shelf(9),
      voc(4),
    ],
    table: si([
      pot([25, 15, 8], { mass: kilogram }),
      recoat([
        [16, 48],
        [8, 24],
        [5, 16],
      ]),
      foot([14, 8, 5]),
      wheels([36, 24, 16]),
      cure([7, 5, 4]),
    ]),
  },
  {
    name: 'Teasel Swift 90',
    maker: 'Teasel',
    chemistry: 'polyaspartic',
    color: '#c8c2b0',
    parts: ['Teasel Swift 90, Component A', 'Teasel Swift 90, Component B'],
    use: 'Fast light-fast top coat',
    dated: '2025-07-01',
    price: 205,
    values: [
      ratio('Mixing ratio A : B', [1, 1], 'volume'),
      split(true),
      solids(92),
      voc(48),
      range('filmThickness', 'Film per coat', [150, 300, 'µm', { film: 'wet' }]),
      ...climateC(5, 35, 85),
      range('packSize', 'Kit', [10, 10, 'L']),
      shelf(12),
    ],
    table: si([
      pot([40, 25, 12], { volume: { value: 1, unit: 'L' } }),
      recoat([
        [4, 12],
        [2, 6],
        [1, 3],
      ]),
      foot([8, 4, 3]),
      wheels([36, 24, 18]),
      cure([6, 4, 3]),
    ]),
  },
  {
    name: 'Corbel Silicate Seal',
    maker: 'Corbel',
    chemistry: 'other mineral',
    color: '#cfcfc8',
    parts: ['Corbel Silicate Seal'],
    use: 'Penetrating sealer against dusting',
    dated: '2024-03-22',
    price: 110,
    values: [
      range('spreadRate', 'Coverage', [300, 500, 'ft²/gal']),
      range('filmThickness', 'Film per coat', [2, 6, 'mil', { film: 'wet' }]),
      range('volumeSolids', 'Solids by volume', [18, 18, '%']),
      voc(0),
      ...climate(40, 95, 95),
      range('packSize', 'Pail', [5, 5, 'gal']),
      shelf(12),
    ],
    table: us([
      recoat([
        [4, 24],
        [2, 12],
        [1, 8],
      ]),
      foot([6, 3, 2]),
      wheels([24, 12, 8]),
    ]),
  },
]

/** The older data sheet of Ostrel 110: its window was longer. Both revisions are in the demo; the newer is in force. */
export const supersededRevision = {
  mix: 'Ostrel 110 Clear',
  dated: '2024-05-06',
  windows: [
    [18, 72],
    [9, 48],
    [5, 24],
  ] as [number, number][],
}
/** This sheet contradicts itself: its ratio by volume and by weight do not go together through the densities. */
export const contradictoryMix = 'Ostrel 45 Water-borne'
