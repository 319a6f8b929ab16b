import { useQuery } from '@tanstack/vue-query'
import { fetchCatalogue } from '@/api/catalogue'
import { tubeBook, type TubeBook } from '@/scenario/tube-book'
import { useWords } from './useWords'

/** The catalogue changes a few times a year [ms]. */
const FRESH = 600_000

/** Names and revisions of the catalogue's tubes, in the words of the page. */
export function useTubeBook(): TubeBook {
  const { t } = useWords()
  const { data } = useQuery({
    queryKey: ['catalogue'],
    queryFn: ({ signal }) => fetchCatalogue(signal),
    staleTime: FRESH,
  })
  const nameOf = (diameter: number) => t('scenarioPage.tube', { diameter: diameter.toFixed(2) })
  return { nameOf, revisionOf: (tube) => tubeBook(nameOf, data.value).revisionOf(tube) }
}
