import { type Property, definitionOf } from '../../../shared/domain/property.ts'
import type { RecordKind } from './queries.ts'

export interface PropertyGroup {
  title: string
  properties: readonly Property[]
}

/** Every property, in groups as a record page shows them. */
export const propertyGroups: readonly PropertyGroup[] = [
  {
    title: 'Mixing',
    properties: ['mixRatio', 'splitKit', 'inductionTime', 'potLife', 'density', 'viscosity', 'volumeSolids', 'weightSolids', 'voc'],
  },
  {
    title: 'Laying',
    properties: [
      'workingTime',
      'filmThickness',
      'spreadRate',
      'consumption',
      'recoatWindow',
      'tackFree',
      'footTraffic',
      'vehicleTraffic',
      'fullCure',
    ],
  },
  {
    title: 'Slab and air',
    properties: [
      'applicationTemperature',
      'maxRelativeHumidity',
      'dewPointMargin',
      'substrateRelativeHumidity',
      'moistureEmission',
      'surfaceProfile',
      'pullOffStrength',
    ],
  },
  { title: 'Packs and storage', properties: ['packSize', 'packPrice', 'shelfLife', 'storageTemperature'] },
  {
    title: 'Hazards',
    properties: ['signalWord', 'hazardStatements', 'supplementalStatements', 'precautionaryStatements', 'ingredient', 'flashPoint'],
  },
  { title: 'Protection', properties: ['gloves', 'eyeProtection', 'respiratoryProtection', 'emergencyPhone'] },
  { title: 'Transport', properties: ['unNumber', 'properShippingName', 'transportClass', 'packingGroup'] },
  { title: 'On the sheet itself', properties: ['productName', 'revisionDate'] },
]

/** A safety sheet speaks of a product; a data sheet of what goes on the floor, and of the density, packs and storage of each product. */
const ofProducts = new Set<Property>(['packSize', 'shelfLife', 'storageTemperature', 'viscosity'])

/** True when a sheet of such a record would be expected to say it, so that its silence is worth telling. */
export function isExpected(kind: RecordKind, property: Property): boolean {
  const { source } = definitionOf(property)
  if (source === 'firm' || property === 'productName' || property === 'revisionDate') return false
  return kind === 'product' ? source === 'safety' || source === 'both' || ofProducts.has(property) : source !== 'safety'
}
