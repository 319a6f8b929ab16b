import { useQuery } from '@tanstack/vue-query'
import { fetchOrganisations } from '@/api/admin'

/** Organisations of all accounts; several pages of the administration choose among them. */
export function useOrganisations() {
  return useQuery({
    queryKey: ['admin', 'organisations'],
    queryFn: ({ signal }) => fetchOrganisations(signal),
  })
}
