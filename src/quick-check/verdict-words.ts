import type { LeaveLevel } from '@shared/checks/leave-level'
import type { HoldsTo, LoadedShapeResult } from '@shared/schemas/section-result'
import type { ResolveText, TextValues } from '@shared/texts/format-text'
import type { Quantity } from '@shared/units'

/** The water of a case: depth, and its level once the ground level is known. */
export interface WaterPlace {
  readonly depth: number
  readonly level: number | null
  readonly ground: number | null
}

function length(value: number, rounding?: 'down'): Quantity {
  return { value, kind: 'length', ...(rounding ? { rounding } : {}) }
}

/** A limit as depth and, where the ground is known, as level; both rounded down. */
function limit(depth: number, { ground }: WaterPlace): { form: string; values: TextValues } {
  const values = { depth: length(depth, 'down') }
  if (ground === null) return { form: 'AsDepth', values }
  return { form: 'AsLevel', values: { ...values, level: length(ground + depth, 'down') } }
}

/** "Level 3.290 m (0.420 m of water)". */
export function waterWords(say: ResolveText, { depth, level }: WaterPlace): string {
  if (level === null)
    return say({ key: 'quickCheck.verdict.asDepth', values: { depth: length(depth) } })
  const values = { level: length(level), depth: length(depth) }
  return say({ key: 'quickCheck.verdict.asLevel', values })
}

/** "holds to 0.489 m, then slides". Without a skirt, and where nothing holds, the word does not occur. */
export function holdsToWords(
  say: ResolveText,
  holdsTo: HoldsTo,
  place: WaterPlace,
  isSkirtless: boolean,
): string {
  if (isSkirtless) return say({ key: 'quickCheck.verdict.holdsTo.noSkirt' })
  const then = say({ key: `checks.then.${holdsTo.check}` })
  if (holdsTo.from === null)
    return say({ key: 'quickCheck.verdict.holdsTo.none', values: { then } })
  const { form, values } = limit(holdsTo.depth, place)
  if (holdsTo.from > 0) {
    const from = { ...length(holdsTo.from), rounding: 'up' as const }
    return say({ key: `quickCheck.verdict.holdsTo.from${form}`, values: { ...values, from, then } })
  }
  const isPast = place.depth > holdsTo.depth
  const key = isPast
    ? `quickCheck.verdict.holdsTo.only${form}`
    : `quickCheck.verdict.holdsTo.to${form}`
  return say({ key, values: { ...values, then } })
}

/** The leave level, in its sentence. */
export function leaveWords(say: ResolveText, leave: LeaveLevel, place: WaterPlace): string {
  if (leave.depth === null) return say({ key: 'quickCheck.verdict.leave.none' })
  if (leave.depth <= 0 && place.ground === null) {
    const isNow = leave.state === 'leave-now'
    return say({ key: `quickCheck.verdict.leave.${isNow ? 'nowDry' : 'whileDry'}` })
  }
  const { form, values } = limit(leave.depth, place)
  return say({ key: `quickCheck.verdict.leave.${leave.state}.${form}`, values })
}

/** Why no shape stands, in words; null while one does, or where the missing skirt already says it. */
export function shapeWords(
  say: ResolveText,
  shape: LoadedShapeResult,
  depth: number,
  diameter: number,
): string | null {
  if (shape.solved || shape.reason === 'no-skirt') return null
  if (shape.reason === 'gives-way') return say({ key: 'quickCheck.verdict.givesWay' })
  const height: Quantity = { value: depth - diameter, kind: 'length' }
  return depth > diameter
    ? say({ key: 'quickCheck.verdict.overtopped', values: { height } })
    : say({ key: 'quickCheck.verdict.overtoppedLoaded' })
}
