import type { Catalogue } from '@shared/schemas/catalogue'
import type { Crew, Depot, StoreItem, StoreKind } from '@shared/schemas/depot'

/** A tube of the catalogue. */
export type OfferedTube = Catalogue['barriers'][number]

/** What a person changes of a depot. */
export interface DepotFields {
  name: string
  note: string
  callOutTime: number
  loadTime: number
  driveTime: number
  crews: Crew[]
  items: StoreItem[]
}

/** The bounds of the API. */
export const DEPOT_TIME = { min: 0, max: 604_800, unit: 's' } as const
export const CREW_COUNT = { min: 1, max: 100, unit: '–' } as const
export const CREW_PEOPLE = { min: 1, max: 50, unit: '–' } as const
export const AMOUNT = { min: 0, max: 100_000, unit: '–' } as const
export const PIPE = { min: 0, minExcluded: true, max: 5, unit: 'm' } as const
export const BAG_MASS = { min: 0, minExcluded: true, max: 2000, unit: 'kg' } as const

/** The fields of a depot, or those of a new one. */
export function depotFields(depot: Depot | null): DepotFields {
  return {
    name: depot?.name ?? '',
    note: depot?.note ?? '',
    callOutTime: depot?.callOutTime ?? 0,
    loadTime: depot?.loadTime ?? 0,
    driveTime: depot?.driveTime ?? 0,
    crews: depot?.crews.map((crew) => ({ ...crew })) ?? [],
    items: depot?.items.map((item) => ({ ...item })) ?? [],
  }
}

/** A row of another kind has the sizes that the kind has, and no others. */
export function itemOfKind(item: StoreItem, kind: StoreKind, firstTube: string): StoreItem {
  const isBag = kind === 'ballast-bag' || kind === 'edge-bag'
  return {
    ...item,
    kind,
    barrierId: kind === 'tube' ? (item.barrierId ?? firstTube) : null,
    diameter: kind === 'plug' ? item.diameter : null,
    mass: isBag ? item.mass : null,
  }
}

export const NEW_CREW: Crew = { crews: 1, people: 2, delay: 0, note: '' }

export function newItem(firstTube: string): StoreItem {
  const none = { diameter: null, mass: null }
  return { kind: 'tube', barrierId: firstTube, ...none, serviceable: 0, inRepair: 0, note: '' }
}
