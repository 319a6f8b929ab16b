import type { ForecastBand, ForecastListItem, RestingForecast } from '../schemas/forecast'

/**
 * Whether what rests on a forecast issue still rests on the newest:
 * - `current`: it does
 * - `newer-issue`: a newer issue of the gauge is there
 * - `newer-observed`: the issue is the newest, and an observed level has shifted it since
 * - `gone`: the issue is no longer there
 */
export type RestState = 'current' | 'newer-issue' | 'newer-observed' | 'gone'

/** What the state rests on: an issue, its moment and its shift. */
export type IssueOfGauge = Pick<ForecastListItem, 'id' | 'issuedAt' | 'shift'>

/** An issue with the crest that a scenario takes over. */
export type IssueWithCrest = IssueOfGauge & Pick<ForecastListItem, 'gaugeId' | 'crest'>

/** State of what rests on an issue; `newest` is the newest of its gauge, if there is any. */
export function restState(resting: RestingForecast, newest: IssueOfGauge | undefined): RestState {
  if (!newest) return 'gone'
  if (newest.id === resting.forecastId) {
    return (newest.shift?.at ?? null) === resting.shiftedAt ? 'current' : 'newer-observed'
  }
  return newest.issuedAt >= resting.issuedAt ? 'newer-issue' : 'gone'
}

/** What a scenario takes over from an issue. */
export interface TakenOver {
  readonly forecast: RestingForecast
  readonly waterLevel: number
  readonly levelLow: number | null
  readonly levelHigh: number | null
}

/**
 * The crest of an issue as the level of a scenario, with its band; the scenario then rests on it.
 *
 * @returns null where the issue has no level, or not the band.
 */
export function takenOver(
  { id, gaugeId, issuedAt, shift, crest }: IssueWithCrest,
  band: ForecastBand,
): TakenOver | null {
  const waterLevel = crest?.[band] ?? null
  if (crest === null || waterLevel === null) return null
  const forecast = { gaugeId, forecastId: id, issuedAt, band, shiftedAt: shift?.at ?? null }
  return { forecast, waterLevel, levelLow: crest.low, levelHigh: crest.high }
}
