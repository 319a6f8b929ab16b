import { LAYING_STEPS } from '../catalogue/laying-times'
import { isInRange, rangeFault, type AllowedRange, type Fault } from '../errors'
import type { DeploymentSettings, SizeTimes } from './deployment'

const DAY = 86_400
const upTo = (max: number, unit: string): AllowedRange => ({ min: 0, max, unit })

/** What the figures of a plan may be, moments until the year 2200; form, API and messages read it. */
export const DEPLOYMENT_RANGES = {
  decidedAt: { min: 0, max: 7_258_118_400_000, unit: 'ms since 1970' },
  pairs: { min: 1, max: 50, unit: '–' },
  blowers: { min: 1, max: 50, unit: '–' },
  wantedMargin: upTo(2 * DAY, 's'),
  clearingTime: upTo(DAY, 's'),
  edgeBagTime: upTo(3600, 's'),
  callOutTime: upTo(7 * DAY, 's'),
  loadTime: upTo(7 * DAY, 's'),
  driveTime: upTo(7 * DAY, 's'),
  gust: upTo(60, 'm/s'),
} as const satisfies Readonly<Record<string, AllowedRange>>

/** Longest that one step of one section can take [s]. */
export const STEP_RANGE: AllowedRange = upTo(DAY, 's')

/** As of a barrier [m]. */
const DIAMETER: AllowedRange = { min: 0.2, max: 3, unit: 'm' }

/**
 * Everything in the settings of a plan that cannot be computed.
 *
 * @param place Chainages of the line [m].
 */
export function deploymentFaults(
  settings: DeploymentSettings | null | undefined,
  place: AllowedRange,
): readonly Fault[] {
  // Contents that were stored before plans were there lack them.
  if (!settings) return []
  const plain = Object.entries(DEPLOYMENT_RANGES).flatMap(([field, range]) =>
    faultOutside(field, settings[field as keyof typeof DEPLOYMENT_RANGES], range),
  )
  return [
    ...plain,
    ...faultOutside('outwardFrom', settings.outwardFrom, place),
    ...settings.sizeTimes.flatMap(sizeFaults),
  ]
}

function sizeFaults({ diameter, times }: SizeTimes, index: number): readonly Fault[] {
  const path = `sizeTimes[${index}]`
  return [
    ...faultOutside(`${path}.diameter`, diameter, DIAMETER),
    ...LAYING_STEPS.flatMap((step) =>
      faultOutside(`${path}.times.${step}`, times[step], STEP_RANGE),
    ),
  ]
}

function faultOutside(field: string, value: number | null, range: AllowedRange): readonly Fault[] {
  if (value === null || isInRange(value, range)) return []
  return [rangeFault(`content.deployment.${field}`, value, range)]
}
