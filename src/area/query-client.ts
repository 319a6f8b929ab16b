import { QueryClient } from '@tanstack/vue-query'
import { ApiError } from '@/api/request'

/** Attempts after the first, where the fault may pass by itself. */
const RETRIES = 2

/** No answer, or a server that is busy or out of order: the same question may be answered later. */
function mayPass(error: Error): boolean {
  return error instanceof ApiError && (error.status === null || error.status >= 500)
}

/** What the server said lately, for all pages of the area. */
export function createQueryClient(): QueryClient {
  return new QueryClient({
    defaultOptions: {
      queries: {
        staleTime: 10_000,
        // Answers are replaced, never changed in place: watching each figure of a survey of two
        // thousand stations takes seconds.
        shallow: true,
        // Without a network the question is asked all the same: its failure is what the page shows.
        networkMode: 'always',
        retry: (failures, error) => failures < RETRIES && mayPass(error),
        // Anything but a refusal is a fault of the program and belongs to its error handler.
        throwOnError: (error) => !(error instanceof ApiError),
      },
      mutations: { networkMode: 'always' },
    },
  })
}
