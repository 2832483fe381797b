import { QueryClient } from '@tanstack/react-query'
import { AppError } from '../../shared/api/errors.ts'

/** Questions are asked again only when no answer came; an answer that refuses is an answer. */
export function createQueryClient(): QueryClient {
  return new QueryClient({
    defaultOptions: {
      queries: { staleTime: 15_000, retry: (count, error) => count < 2 && !(error instanceof AppError), refetchOnWindowFocus: true },
      mutations: { retry: false },
    },
  })
}
