import type { ForecastListItem, RestingForecast } from '../schemas/forecast'

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

/** The newest issue of a gauge: by moment of issue; the first of the list among equals. */
export function newestIssue<Issue extends IssueOfGauge>(
  issues: readonly Issue[],
): Issue | undefined {
  return issues.reduce<Issue | undefined>(
    (newest, issue) => (newest && newest.issuedAt >= issue.issuedAt ? newest : issue),
    undefined,
  )
}

/** State of what rests on an issue; `issues` are all of its gauge, the newest first. */
export function restState(resting: RestingForecast, issues: readonly IssueOfGauge[]): RestState {
  const newest = newestIssue(issues)
  if (newest && newest.id !== resting.forecastId) return 'newer-issue'
  const own = issues.find(({ id }) => id === resting.forecastId)
  if (!own) return 'gone'
  return (own.shift?.at ?? null) === resting.shiftedAt ? 'current' : 'newer-observed'
}
