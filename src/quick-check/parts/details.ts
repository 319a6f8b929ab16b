import { airPart } from './air-part'
import { bendsPart, edgePart } from './barrier-parts'
import type { PartGroup, PartId, PartInput } from './part'
import { currentPart, debrisPart, dryPart, wavesPart } from './water-parts'

/** What a part shows when it is opened: its inputs, what follows from them, and what to know about it. */
export const PART_DETAILS: Readonly<Record<PartId, (input: PartInput) => readonly PartGroup[]>> = {
  waves: wavesPart,
  current: currentPart,
  debris: debrisPart,
  air: airPart,
  dry: dryPart,
  edge: edgePart,
  bends: bendsPart,
}
