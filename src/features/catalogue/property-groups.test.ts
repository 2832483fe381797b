import { expect, it } from 'vitest'
import { propertyNames } from '../../../shared/domain/property.ts'
import { propertyGroups } from './property-groups.ts'

it('puts every property in one group and in no second', () => {
  expect(propertyGroups.flatMap(({ properties }) => properties).sort()).toEqual([...propertyNames].sort())
})
