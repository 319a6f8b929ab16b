import { pipeInflow } from '../calc/line/pipe-inflow'
import { breachFlow } from '../calc/moving-water/breach-flow'
import type { Station } from '../schemas/line'
import type { EndKind, LineEnd, LineEnds, LineMark, MarkKind } from '../schemas/mark'
import type { ScenarioContent } from '../schemas/scenario'

/** A way on which water gets past the line. */
export interface WaterWay {
  readonly at: 'mark' | 'start' | 'end'
  /** Place in the list of marks; null for an end. */
  readonly mark: number | null
  readonly kind: MarkKind | EndKind
  readonly chainage: number
  /** `flows` now; `waits`: open, but the water does not reach it; `short`: lower than asked, and dry. */
  readonly standing: 'flows' | 'waits' | 'short'
  /** Flow, an upper bound [m³/s]; null where only the flow per metre is known. */
  readonly flow: number | null
  /** Flow per metre of an opening whose width nobody entered [m²/s]. */
  readonly flowPerMetre: number | null
  /** How much lower than level and freeboard an end is [m]; 0 for marks. */
  readonly shortBy: number
}

type Water = Pick<ScenarioContent, 'waterLevel' | 'dryLevel' | 'gravity' | 'requiredFreeboard'>

/**
 * Ways past a line: marks that are open, and ends that are open or too low. What is plugged, has a flap
 * or ties in high enough is left out. Each one flows until it is plugged or the line is moved.
 */
export function waterWays(
  line: {
    readonly stations: readonly Station[]
    readonly marks: readonly LineMark[]
    readonly ends: LineEnds
  },
  water: Water,
): readonly WaterWay[] {
  const marks = line.marks.flatMap((mark, index) => {
    const flow = mark.state === 'open' ? flowOf(mark, water) : null
    if (flow === null) return []
    const { kind, chainage } = mark
    const standing = flow > 0 ? ('flows' as const) : ('waits' as const)
    const open = { flow, flowPerMetre: null, shortBy: 0 }
    return [{ at: 'mark' as const, mark: index, kind, chainage, standing, ...open }]
  })
  if (line.stations.length < 2) return marks
  const [first, last] = [line.stations[0]!, line.stations[line.stations.length - 1]!]
  return [
    ...marks,
    ...endWay('start', line.ends.start, first, water),
    ...endWay('end', line.ends.end, last, water),
  ].sort((a, b) => a.chainage - b.chainage)
}

/** Flow through a mark [m³/s]; null for one that leads no water. */
function flowOf(mark: LineMark, water: Water): number | null {
  const { waterLevel, dryLevel, gravity } = water
  const { kind, diameter, level, width, fromLevel, flow } = mark
  if (kind === 'well') {
    if (flow === null || fromLevel === null) return null
    return waterLevel > fromLevel ? flow : 0
  }
  if (level === null) return null
  const head = waterLevel - Math.max(level, dryLevel ?? -Infinity)
  if (kind === 'gate') {
    return width === null ? null : breachFlow(Math.max(0, head), width, gravity).steady
  }
  const isPipe = kind === 'gully' || kind === 'outfall' || kind === 'pipe'
  return isPipe && diameter !== null ? pipeInflow({ diameter, head, gravity }) : null
}

/** Top of what an end ties into [m]; null where the end is closed by itself. */
export function endTop(end: LineEnd, { groundLevel }: Pick<Station, 'groundLevel'>): number | null {
  if (end.kind === 'closure') return null
  return end.kind === 'wall' ? (end.level ?? groundLevel) : groundLevel
}

function endWay(
  at: 'start' | 'end',
  end: LineEnd,
  station: Station,
  { waterLevel, requiredFreeboard, gravity }: Water,
): readonly WaterWay[] {
  const top = endTop(end, station)
  if (top === null) return []
  const depth = Math.max(0, waterLevel - top)
  const shortBy = Math.max(0, waterLevel + requiredFreeboard - top)
  // 1e-9 m: what binary arithmetic adds to level and freeboard.
  if (end.kind !== 'open' && shortBy <= 1e-9) return []
  const { steady } = breachFlow(depth, end.width ?? 1, gravity)
  const dry = end.kind === 'open' ? ('waits' as const) : ('short' as const)
  return [
    {
      at,
      mark: null,
      kind: end.kind,
      chainage: station.chainage,
      standing: depth > 0 ? 'flows' : dry,
      flow: end.width === null && depth > 0 ? null : steady,
      flowPerMetre: end.width === null && depth > 0 ? steady : null,
      shortBy: shortBy <= 1e-9 ? 0 : shortBy,
    },
  ]
}
