import type { AllowedRange } from '../errors'
import type { Station } from './line'

/** Chainages of a line, as a range that a message can name. */
export interface ChainageRange extends AllowedRange {
  readonly unit: 'm'
}

/** From the first station to the last; a line with one station is one section long. */
export function chainageBounds(line: {
  readonly stations: readonly Station[]
  readonly sectionLength: number
}): ChainageRange {
  const min = line.stations[0]!.chainage
  const last = line.stations[line.stations.length - 1]!.chainage
  return { min, max: last > min ? last : min + line.sectionLength, unit: 'm' }
}
