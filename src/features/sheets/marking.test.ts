import { describe, expect, it } from 'vitest'
import { backWith, between, boxOf, closeAround, nudged } from './marking.ts'

const place = {
  revisionId: 'r1',
  page: 2,
  box: [10.04, 20, 30, 40.26] as [number, number, number, number],
  quote: 'Pot life & more: 25–30 min',
}
const size = { width: 612, height: 792 }

describe('the way back from marking a place', () => {
  it('adds revision, page, box and quote to the query of the page that asked', () => {
    const address = new URL(backWith('/products/p1/values/new?property=potLife#value', place) ?? '', 'https://x.invalid')
    expect(address.pathname + address.hash).toBe('/products/p1/values/new#value')
    expect(Object.fromEntries(address.searchParams)).toEqual({
      property: 'potLife',
      revision: 'r1',
      page: '2',
      box: '10,20,30,40.3',
      quote: 'Pot life & more: 25–30 min',
    })
  })

  it('replaces a place marked before', () => {
    expect(backWith('/x?page=1&quote=old', { ...place, quote: 'new' })).toBe('/x?page=2&quote=new&revision=r1&box=10%2C20%2C30%2C40.3')
  })

  it.each([
    '//elsewhere.example',
    '/\\elsewhere.example',
    'https://elsewhere.example',
    'javascript:alert(1)',
    'x',
    '',
    '/\t/elsewhere.example',
  ])('leads nowhere but to this site: %j', (address) => {
    expect(backWith(address, place) ?? '/').toMatch(/^\/(?![/\\])/)
  })
})

describe('a box', () => {
  it('is read from the address only when it is one', () => {
    expect(boxOf('1,2,3,4')).toEqual([1, 2, 3, 4])
    for (const text of [null, '', '1,2,3', '3,2,1,4', '1,2,x,4', '1,2,3,4,5']) expect(boxOf(text)).toBeUndefined()
  })

  it('closes around the words it holds, and stays as drawn over none', () => {
    expect(
      closeAround(
        [
          ['25', 12, 12, 20, 22],
          ['min', 22, 12, 36, 22],
        ],
        [10, 5, 40, 30],
      ),
    ).toEqual([12, 12, 36, 22])
    expect(closeAround([], [10, 5, 40, 30])).toEqual([10, 5, 40, 30])
  })

  it('moves and grows by keys and stays on the page', () => {
    expect(nudged([10, 10, 50, 20], { x: -20, y: 5 }, { size, sizing: false })).toEqual([0, 15, 40, 25])
    expect(nudged([580, 10, 600, 20], { x: 50, y: 0 }, { size, sizing: true })).toEqual([580, 10, 612, 20])
    expect(nudged([10, 10, 20, 20], { x: -50, y: -50 }, { size, sizing: true })).toEqual([10, 10, 14, 14])
  })

  it('is the same whichever corner it is drawn from', () => {
    expect(between({ x: 50, y: 60 }, { x: -5, y: 20 }, size)).toEqual([0, 20, 50, 60])
  })
})
