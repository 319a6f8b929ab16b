import type { CatalogueBarrier } from '@shared/catalogue/barriers'
import type { Catalogue } from '@shared/schemas/catalogue'
import { TUBE_FIELDS } from '@/quick-check/tube'

/** What a scenario notes of a tube beside its figures. */
export interface TubeBook {
  /** Names a barrier by its diameter [m], as it is kept. */
  readonly nameOf: (diameter: number) => string
  /** Revision of the catalogue's entry; null where the catalogue does not have these figures. */
  readonly revisionOf: (tube: CatalogueBarrier) => number | null
}

/** @param catalogue What the server said; left out while it has said nothing. */
export function tubeBook(
  nameOf: TubeBook['nameOf'],
  catalogue: Pick<Catalogue, 'barriers'> | undefined,
): TubeBook {
  return {
    nameOf,
    revisionOf: (tube) => {
      const entry = catalogue?.barriers.find(({ id }) => id === tube.id)
      const isSame = entry && TUBE_FIELDS.every((field) => entry[field] === tube[field])
      return isSame ? entry.revision : null
    },
  }
}
