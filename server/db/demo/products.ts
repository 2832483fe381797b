import type { ProductKind } from '../../../shared/domain/product.ts'

/** An invented product of the demo, with what its safety sheet says. Substances are real, products and figures are not. */
export interface DemoProduct {
  name: string
  maker: 'Ostrel' | 'Teasel' | 'Corbel'
  kind: ProductKind
  chemistry: 'epoxy' | 'polyurethane' | 'polyurea' | 'polyaspartic' | 'urethane cement' | 'silica' | 'other mineral' | 'other'
  /** As its safety sheet states it. */
  density: [number, 'lb/gal' | 'kg/L']
  hazards: Hazards
  /** Date of its safety sheet. */
  dated: string
  flashPoint?: [number, '°F' | '°C']
}

export interface Hazards {
  signal: 'Danger' | 'Warning' | null
  h: string[]
  p: string[]
  euh?: string[]
  ingredients: [name: string, cas: string, min: number | null, max: number][]
  gloves: string
  eyes: string
  breathing: string
  transport?: [un: string, name: string, group: string, packing: string]
}

const bisphenolA = 'Reaction product of bisphenol A and epichlorohydrin (MW ≤ 700)'
const firstAid = ['P302+P352', 'P305+P351+P338']

const epoxyResin: Hazards = {
  signal: 'Warning',
  h: ['H315', 'H317', 'H319', 'H411'],
  euh: ['EUH205'],
  p: ['P261', 'P264', 'P272', 'P273', 'P280', ...firstAid, 'P333+P313', 'P337+P313', 'P391', 'P501'],
  ingredients: [
    [bisphenolA, '25068-38-6', 60, 80],
    ['Oxirane, mono[(C12-14-alkyloxy)methyl] derivs.', '68609-97-2', 10, 20],
  ],
  gloves: 'Nitrile, at least 0.4 mm, changed at once when splashed',
  eyes: 'Safety glasses with side shields',
  breathing: 'None with good ventilation; organic vapour filter where air is poor',
  transport: ['UN3082', 'Environmentally hazardous substance, liquid, n.o.s. (epoxy resin)', '9', 'III'],
}
const amineHardener: Hazards = {
  signal: 'Danger',
  h: ['H302', 'H314', 'H317', 'H412'],
  p: [
    'P260',
    'P264',
    'P272',
    'P273',
    'P280',
    'P301+P330+P331',
    'P303+P361+P353',
    'P304+P340',
    'P305+P351+P338',
    'P310',
    'P333+P313',
    'P405',
    'P501',
  ],
  ingredients: [
    ['Benzyl alcohol', '100-51-6', 30, 50],
    ['Isophoronediamine', '2855-13-2', 20, 40],
    ['m-Xylylenediamine', '1477-55-0', 5, 10],
  ],
  gloves: 'Butyl rubber, 0.5 mm, changed every 4 hours',
  eyes: 'Splash goggles and a face shield',
  breathing: 'Half-mask with filters for organic vapour and ammonia where air is poor',
  transport: ['UN2735', 'Amines, liquid, corrosive, n.o.s. (isophoronediamine)', '8', 'III'],
}
const waterborneResin: Hazards = { ...epoxyResin, h: ['H315', 'H317', 'H319', 'H412'], ingredients: [[bisphenolA, '25068-38-6', 30, 50]] }
const waterborneHardener: Hazards = {
  ...amineHardener,
  signal: 'Danger',
  h: ['H315', 'H317', 'H318'],
  p: ['P261', 'P264', 'P272', 'P280', ...firstAid, 'P310', 'P333+P313', 'P501'],
  ingredients: [['Triethylenetetramine', '112-24-3', 1, 3]],
}
const isocyanate: Hazards = {
  signal: 'Warning',
  h: ['H226', 'H317', 'H332', 'H335'],
  euh: ['EUH204'],
  p: ['P210', 'P261', 'P271', 'P272', 'P280', 'P302+P352', 'P304+P340', 'P312', 'P333+P313', 'P403+P233', 'P501'],
  ingredients: [
    ['Hexamethylene diisocyanate, oligomers', '28182-81-2', 60, 80],
    ['n-Butyl acetate', '123-86-4', 20, 30],
    ['Hexamethylene diisocyanate', '822-06-0', null, 0.3],
  ],
  gloves: 'Butyl rubber, 0.7 mm, over 480 min',
  eyes: 'Goggles',
  breathing: 'Filter A2-P2 when rolled in closed rooms; training before use',
  transport: ['UN1866', 'Resin solution', '3', 'III'],
}
const aromaticIsocyanate: Hazards = {
  signal: 'Danger',
  h: ['H315', 'H317', 'H319', 'H332', 'H334', 'H335', 'H351', 'H373'],
  euh: ['EUH204'],
  p: ['P201', 'P260', 'P264', 'P272', 'P280', 'P284', 'P302+P352', 'P304+P340', 'P305+P351+P338', 'P308+P313', 'P342+P311', 'P501'],
  ingredients: [
    ['Diphenylmethanediisocyanate, isomers and homologues', '9016-87-9', 60, 100],
    ["4,4'-Methylenediphenyl diisocyanate", '101-68-8', 30, 50],
  ],
  gloves: 'Nitrile over butyl, 0.7 mm in all',
  eyes: 'Goggles',
  breathing: 'As the exposure assessment says; training before use',
}
const polyol: Hazards = {
  signal: 'Warning',
  h: ['H317', 'H412'],
  p: ['P261', 'P272', 'P273', 'P280', 'P302+P352', 'P333+P313', 'P501'],
  ingredients: [['Aspartic acid ester mixture', '136210-30-5', 50, 80]],
  gloves: 'Nitrile, 0.4 mm',
  eyes: 'Safety glasses',
  breathing: 'None with good ventilation',
}
const polyolSolvent: Hazards = {
  ...polyol,
  h: ['H226', 'H336', 'H412'],
  p: ['P210', 'P261', 'P271', 'P273', 'P280', 'P304+P340', 'P403+P235', 'P501'],
  ingredients: [['n-Butyl acetate', '123-86-4', 20, 30]],
}
const quartz: Hazards = {
  signal: 'Danger',
  h: ['H350', 'H372'],
  p: ['P201', 'P260', 'P264', 'P280', 'P308+P313', 'P501'],
  ingredients: [['Quartz', '14808-60-7', 95, 100]],
  gloves: 'Work gloves',
  eyes: 'Safety glasses with side shields',
  breathing: 'As the silica exposure assessment says',
}
const cement: Hazards = {
  signal: 'Danger',
  h: ['H315', 'H317', 'H318', 'H335'],
  p: ['P261', 'P264', 'P280', ...firstAid, 'P310', 'P333+P313', 'P501'],
  ingredients: [
    ['Portland cement', '65997-15-1', 20, 40],
    ['Quartz', '14808-60-7', 40, 60],
  ],
  gloves: 'Nitrile, 0.4 mm',
  eyes: 'Goggles',
  breathing: 'FFP3 when tipping bags',
}
const silicate: Hazards = {
  signal: 'Warning',
  h: ['H315', 'H319'],
  p: ['P264', 'P280', ...firstAid, 'P337+P313'],
  ingredients: [['Silicic acid, lithium salt', '12627-14-4', 10, 20]],
  gloves: 'Nitrile, 0.2 mm',
  eyes: 'Safety glasses',
  breathing: 'None when brushed or flooded',
}

type Row = [
  name: string,
  maker: DemoProduct['maker'],
  kind: ProductKind,
  chemistry: DemoProduct['chemistry'],
  density: DemoProduct['density'],
  hazards: Hazards,
  dated: string,
  flash?: DemoProduct['flashPoint'],
]
const rows: Row[] = [
  ['Ostrel 110 Clear, Part A', 'Ostrel', 'resin', 'epoxy', [9.4, 'lb/gal'], epoxyResin, '2025-02-10', [300, '°F']],
  ['Ostrel 110 Clear, Part B', 'Ostrel', 'hardener', 'epoxy', [8.4, 'lb/gal'], amineHardener, '2025-02-10', [212, '°F']],
  ['Ostrel 115 Slurry Binder, Part A', 'Ostrel', 'resin', 'epoxy', [9.5, 'lb/gal'], epoxyResin, '2025-02-10', [300, '°F']],
  ['Ostrel 115 Slurry Binder, Part B', 'Ostrel', 'hardener', 'epoxy', [8.4, 'lb/gal'], amineHardener, '2025-02-10', [212, '°F']],
  ['Ostrel 140 Damp Primer, Part A', 'Ostrel', 'primer', 'epoxy', [9.6, 'lb/gal'], epoxyResin, '2024-09-02', [290, '°F']],
  ['Ostrel 140 Damp Primer, Part B', 'Ostrel', 'hardener', 'epoxy', [8.7, 'lb/gal'], amineHardener, '2024-09-02', [205, '°F']],
  ['Ostrel 220 Gloss, Part A', 'Ostrel', 'resin', 'epoxy', [11.2, 'lb/gal'], epoxyResin, '2025-03-14', [300, '°F']],
  ['Ostrel 220 Gloss, Part B', 'Ostrel', 'hardener', 'epoxy', [8.4, 'lb/gal'], amineHardener, '2025-03-14', [212, '°F']],
  ['Ostrel 310 Body, Part A', 'Ostrel', 'resin', 'epoxy', [11.8, 'lb/gal'], epoxyResin, '2025-05-20', [300, '°F']],
  ['Ostrel 310 Body, Part B', 'Ostrel', 'hardener', 'epoxy', [8.5, 'lb/gal'], amineHardener, '2025-05-20', [212, '°F']],
  ['Ostrel 45 Water-borne, Part A', 'Ostrel', 'primer', 'epoxy', [9.0, 'lb/gal'], waterborneResin, '2024-06-03'],
  ['Ostrel 45 Water-borne, Part B', 'Ostrel', 'hardener', 'epoxy', [10.8, 'lb/gal'], waterborneHardener, '2024-06-03'],
  [
    'Ostrel Slate Grey paste',
    'Ostrel',
    'additive',
    'other',
    [13.5, 'lb/gal'],
    { ...epoxyResin, h: ['H317'], p: ['P261', 'P280', 'P333+P313', 'P501'], ingredients: [['Titanium dioxide', '13463-67-7', 30, 50]] },
    '2025-01-15',
  ],
  ['Teasel J8 Joint, Part A', 'Teasel', 'hardener', 'polyurea', [1.12, 'kg/L'], aromaticIsocyanate, '2024-11-05', [200, '°C']],
  ['Teasel J8 Joint, Part B', 'Teasel', 'resin', 'polyurea', [1.02, 'kg/L'], polyol, '2021-05-18', [150, '°C']],
  ['Teasel Seal 60, Component A', 'Teasel', 'resin', 'polyurethane', [1.3, 'kg/L'], polyolSolvent, '2025-04-08', [29, '°C']],
  ['Teasel Seal 60, Component B', 'Teasel', 'hardener', 'polyurethane', [1.08, 'kg/L'], isocyanate, '2025-04-08', [47, '°C']],
  ['Teasel Scald 6, Component A', 'Teasel', 'resin', 'urethane cement', [1.06, 'kg/L'], { ...polyol, h: ['H317'] }, '2025-06-11'],
  ['Teasel Scald 6, Component B', 'Teasel', 'hardener', 'urethane cement', [1.22, 'kg/L'], aromaticIsocyanate, '2025-06-11', [200, '°C']],
  ['Teasel Scald 6, Component C', 'Teasel', 'filler', 'other mineral', [2.7, 'kg/L'], cement, '2025-06-11'],
  ['Teasel Swift 90, Component A', 'Teasel', 'resin', 'polyaspartic', [1.05, 'kg/L'], polyol, '2025-07-01', [110, '°C']],
  [
    'Teasel Swift 90, Component B',
    'Teasel',
    'hardener',
    'polyaspartic',
    [1.15, 'kg/L'],
    { ...isocyanate, h: ['H317', 'H332', 'H335'], ingredients: [['Hexamethylene diisocyanate, oligomers', '28182-81-2', 90, 100]] },
    '2025-07-01',
    [170, '°C'],
  ],
  ['Corbel Silicate Seal', 'Corbel', 'primer', 'other mineral', [9.6, 'lb/gal'], silicate, '2024-03-22'],
  ['Corbel 40-mesh silica', 'Corbel', 'aggregate', 'silica', [22.1, 'lb/gal'], quartz, '2025-01-09'],
  ['Corbel 20-40 mesh quartz, dried', 'Corbel', 'aggregate', 'silica', [22.1, 'lb/gal'], quartz, '2025-01-09'],
  ['Corbel silica flour', 'Corbel', 'filler', 'silica', [22.1, 'lb/gal'], quartz, '2025-01-09'],
  ['Corbel fibre thickener', 'Corbel', 'additive', 'other', [8.0, 'lb/gal'], { ...silicate, signal: null, h: [], p: [] }, '2023-10-02'],
]

export const demoProducts: DemoProduct[] = rows.map(([name, maker, kind, chemistry, density, hazards, dated, flash]) => ({
  name,
  maker,
  kind,
  chemistry,
  density,
  hazards,
  dated,
  ...(flash ? { flashPoint: flash } : {}),
}))
/** Its safety sheet is a scan: pictures of pages, from which nothing can be read. */
export const scannedProduct = 'Corbel fibre thickener'
