import { isInRange, OutOfRangeError, rangeFault, type AllowedRange, type Fault } from '../errors'
import type { ForecastCall, ForecastReading } from '../schemas/forecast'
import { STATION_RANGES } from '../schemas/station-ranges'

const HOUR = 3_600_000

/** Between two readings of a sketch: a quarter of an hour [ms]. */
const STEP = HOUR / 4

/** Longest rise, and longest time above the ground: two weeks [h]. Common practice, no source. */
const LONGEST = 336

const LEVEL = STATION_RANGES.groundLevel

/** Widest band: catches centimetres typed as metres [m]. */
const MARGIN: AllowedRange = { min: 0, max: 20, unit: 'm' }

/** Limbs of the sketch, in ms and m. */
interface Limbs {
  readonly rise: number
  readonly fall: number
  /** Where the fall ends. */
  readonly foot: number
}

/**
 * A hydrograph from a telephone call, its levels in the datum of the line: half a cosine from the
 * level now to the crest, mirrored, and the mirrored half stretched so that the water stands above
 * the lowest ground for the hours given. Where the water stands above that ground already, the
 * falling half ends at the ground. The margin stands on every level as its band.
 *
 * With φ = arccos(1 − 2(z_g − z_0)/(z_c − z_0))/π, the share of the rise below the ground z_g, the
 * falling half takes H/(1 − φ) − T_rise.
 *
 * @param call levels in m, moments in ms since 1970, `hoursAbove` in h.
 * @throws OutOfRangeError for a crest that is not above the level now or not after it, for hours that
 * the rise alone exceeds, and for hours above a ground that the crest does not reach.
 * @see Method page, "Event". A sketch, not a forecast: common practice, no source.
 */
export function sketchedReadings(call: ForecastCall): readonly ForecastReading[] {
  const faults = callFaults(call)
  if (faults.length > 0) throw new OutOfRangeError(faults)
  const { at, crestAt, margin } = call
  const limbs = limbsOf(call)
  return sketchMoments(call, limbs).map((time) => {
    const expected =
      time <= crestAt
        ? onHalfCosine(call.levelNow, call.crest, (time - at) / limbs.rise)
        : onHalfCosine(call.crest, limbs.foot, (time - crestAt) / limbs.fall)
    const low = margin === null ? null : expected - margin
    return { time, expected, low, high: margin === null ? null : expected + margin }
  })
}

/** Everything in a call from which no sketch can be drawn. */
export function callFaults(call: ForecastCall, path = 'call'): readonly Fault[] {
  const { levelNow, crest, margin, at, crestAt, lowestGround } = call
  const faults = [
    ...outside(`${path}.levelNow`, levelNow, LEVEL),
    ...outside(`${path}.crest`, crest, { ...LEVEL, min: levelNow, minExcluded: true }),
    ...outside(`${path}.margin`, margin, MARGIN),
    ...outside(`${path}.lowestGround`, lowestGround, LEVEL),
    ...timeFault(`${path}.crestAt`, crestAt - at),
  ]
  return faults.length > 0 ? faults : hoursFaults(call, `${path}.hoursAbove`)
}

function timeFault(path: string, rise: number): Fault[] {
  const range = { min: 0, minExcluded: true, max: LONGEST, unit: 'h after the level now' }
  return outside(path, rise / HOUR, range)
}

function hoursFaults(call: ForecastCall, path: string): Fault[] {
  const { hoursAbove, lowestGround, crest } = call
  if (hoursAbove === null) return []
  if (lowestGround === null || lowestGround >= crest) {
    const allowed =
      lowestGround === null
        ? 'left out where no lowest ground is given'
        : 'left out, because the crest does not stand above the lowest ground'
    const message = `${path}: ${hoursAbove} h is not allowed; it must be ${allowed}`
    return [{ path, value: hoursAbove, allowed, unit: 'h', message }]
  }
  const rise = (shareAbove(call) * (call.crestAt - call.at)) / HOUR
  return outside(path, hoursAbove, { min: rise, minExcluded: true, max: LONGEST, unit: 'h' })
}

function outside(path: string, value: number | null, range: AllowedRange): Fault[] {
  return value === null || isInRange(value, range) ? [] : [rangeFault(path, value, range)]
}

/** Share of the rising half, by time, that stands above the lowest ground: 1 − φ. */
function shareAbove({ levelNow, crest, lowestGround }: ForecastCall): number {
  if (lowestGround === null || lowestGround <= levelNow) return 1
  return 1 - Math.acos(1 - (2 * (lowestGround - levelNow)) / (crest - levelNow)) / Math.PI
}

function limbsOf(call: ForecastCall): Limbs {
  const { levelNow, at, crestAt, hoursAbove, lowestGround } = call
  const rise = crestAt - at
  if (hoursAbove === null || lowestGround === null) return { rise, fall: rise, foot: levelNow }
  const fall = (hoursAbove * HOUR) / shareAbove(call) - rise
  return { rise, fall, foot: Math.min(levelNow, lowestGround) }
}

/** Level on half a cosine from one level to another, at a share of its time. */
function onHalfCosine(from: number, to: number, share: number): number {
  return from + ((to - from) * (1 - Math.cos(Math.PI * share))) / 2
}

/** Quarters of an hour, the crest, the end, and both moments at which the water stands at the ground. */
function sketchMoments(call: ForecastCall, { rise, fall }: Limbs): readonly number[] {
  const { at, crestAt } = call
  const end = crestAt + fall
  const above = shareAbove(call)
  const moments = [at, crestAt - above * rise, crestAt, crestAt + above * fall, end]
  for (let time = (Math.floor(at / STEP) + 1) * STEP; time < end; time += STEP) moments.push(time)
  return [...new Set(moments.map(Math.round))].sort((a, b) => a - b)
}
