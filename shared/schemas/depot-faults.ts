import { showValue, type Fault } from '../errors'
import type { StoreItem, StoreKind } from './depot'

/** What a row of a store cannot do without. */
const NEEDS: Readonly<Partial<Record<StoreKind, 'barrierId' | 'diameter' | 'mass'>>> = {
  tube: 'barrierId',
  'ballast-bag': 'mass',
  'edge-bag': 'mass',
  plug: 'diameter',
}

/** Rows of a store that say too little, or name a tube that nobody knows. */
export function storeFaults(
  items: readonly StoreItem[],
  knownBarriers: readonly string[],
): readonly Fault[] {
  return items.flatMap((item, index) => {
    const needed = NEEDS[item.kind]
    const path = `items[${index}]`
    if (needed !== undefined && item[needed] === null) {
      return [wordFault(`${path}.${needed}`, null, `given for a ${item.kind}`)]
    }
    const { barrierId } = item
    if (barrierId === null || knownBarriers.includes(barrierId)) return []
    return [wordFault(`${path}.barrierId`, barrierId, 'a barrier of the catalogue')]
  })
}

function wordFault(path: string, value: unknown, allowed: string): Fault {
  const message = `${path}: ${showValue(value)} is not allowed; it must be ${allowed}`
  return { path, value, allowed, unit: '–', message }
}
