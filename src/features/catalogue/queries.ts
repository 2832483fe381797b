import { keepPreviousData, useQuery, useQueryClient } from '@tanstack/react-query'
import type * as z from 'zod'
import { type FactBody, type MixRecord, type ProductRecord, catalogueEndpoints as wire } from '../../../shared/api/catalogue.ts'
import { addressOf, call } from '../../lib/api.ts'

export type RecordKind = 'product' | 'mix'
type ListQuery = Record<string, string | undefined>

export function useProducts(query: ListQuery, enabled = true) {
  return useQuery({
    queryKey: ['catalogue', 'products', query],
    queryFn: ({ signal }) => call(wire.listProducts, { query: query, signal }),
    placeholderData: keepPreviousData,
    enabled,
  })
}

export function useMixes(query: ListQuery) {
  return useQuery({
    queryKey: ['catalogue', 'mixes', query],
    queryFn: ({ signal }) => call(wire.listMixes, { query: query, signal }),
    placeholderData: keepPreviousData,
  })
}

export function useMakers() {
  return useQuery({ queryKey: ['catalogue', 'makers'], queryFn: ({ signal }) => call(wire.listMakers, { signal }), staleTime: 60_000 })
}

export function useRecord(kind: RecordKind, id: string) {
  return useQuery({
    queryKey: ['catalogue', kind, id],
    queryFn: ({ signal }): Promise<ProductRecord | MixRecord> =>
      kind === 'product'
        ? call(wire.readProduct, { params: { productId: id }, signal })
        : call(wire.readMix, { params: { mixId: id }, signal }),
  })
}

/** The address of the list as CSV, with the same search, filters and order. */
export function exportAddress(kind: 'products' | 'mixes', query: ListQuery): string {
  return addressOf(kind === 'products' ? wire.exportProducts : wire.exportMixes, { query })
}

/** Everything that changes the catalogue; what rests on it is asked for anew. */
export function useCatalogueChanges() {
  const client = useQueryClient()
  const done = async <T>(result: Promise<T>): Promise<T> => {
    const answer = await result
    await Promise.all([
      client.invalidateQueries({ queryKey: ['catalogue'] }),
      client.invalidateQueries({ queryKey: ['build-ups'] }),
      client.invalidateQueries({ queryKey: ['changes'] }),
    ])
    return answer
  }
  return {
    readProduct: (productId: string) => call(wire.readProduct, { params: { productId } }),
    readMix: (mixId: string) => call(wire.readMix, { params: { mixId } }),
    addProduct: (body: z.input<typeof wire.addProduct.body>) => done(call(wire.addProduct, { body })),
    changeProduct: (productId: string, body: z.input<typeof wire.changeProduct.body>) =>
      done(call(wire.changeProduct, { params: { productId }, body })),
    addMix: (body: z.input<typeof wire.addMix.body>) => done(call(wire.addMix, { body })),
    changeMix: (mixId: string, body: z.input<typeof wire.changeMix.body>) => done(call(wire.changeMix, { params: { mixId }, body })),
    addFact: (kind: RecordKind, id: string, body: FactBody) =>
      done(
        kind === 'product'
          ? call(wire.addProductFact, { params: { productId: id }, body })
          : call(wire.addMixFact, { params: { mixId: id }, body }),
      ),
    amendFact: (factId: string, body: FactBody) => done(call(wire.amendFact, { params: { factId }, body })),
    endFact: (factId: string) => done(call(wire.endFact, { params: { factId } })),
  }
}
