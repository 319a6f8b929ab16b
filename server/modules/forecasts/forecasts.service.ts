import { randomUUID } from 'node:crypto'
import type { z } from 'zod'
import { OutOfRangeError, rangeFault } from '../../../shared/errors'
import { observedFaults } from '../../../shared/forecast/forecast-faults'
import {
  MOST_FORECAST_READINGS,
  type Forecast,
  type ForecastListItem,
  type forecastsSchema,
  type NewForecast,
  type NewObserved,
} from '../../../shared/schemas/forecast'
import type { Gauge } from '../../../shared/schemas/project'
import type { Db } from '../../db/client'
import { NotFoundError } from '../../errors'
import { gaugeAt, type GaugePlace } from '../gauges/gauges.service'
import { change, type Deed, type Doer, noteChange, type ProjectWork } from '../projects/deed'
import { openProject } from '../projects/open-project'
import { answersOf, levelsOfIssue, mergeObserved, observedAtSite } from './forecast-levels'
import {
  deleteForecast,
  findForecast,
  findNewestObserved,
  insertForecast,
  listForecasts,
  listForecastsOfProject,
  updateForecast,
} from './forecasts.queries'

export interface ForecastPlace extends GaugePlace {
  readonly forecastId: string
}

type Forecasts = z.output<typeof forecastsSchema>

/** All issues of a gauge, the newest first. */
export function readForecasts(db: Db, place: GaugePlace): Forecasts {
  gaugeAt(db, place)
  return { forecasts: listForecasts(db, place.gaugeId) }
}

/** The newest issue of each gauge of a project: what a scenario should rest on. */
export function readNewestForecasts(db: Db, projectId: string): Forecasts {
  const newest = new Map<string, ForecastListItem>()
  for (const issue of listForecastsOfProject(db, projectId)) {
    if (!newest.has(issue.gaugeId)) newest.set(issue.gaugeId, issue)
  }
  return { forecasts: [...newest.values()] }
}

export function readForecast(db: Db, place: ForecastPlace): Forecast {
  gaugeAt(db, place)
  return forecastAt(db, place)
}

/**
 * A new issue. What was observed at the gauge so far goes along with it.
 *
 * @throws InvalidInputError, OutOfRangeError, or ConflictError while the project is archived.
 */
export function createForecast(
  work: ProjectWork,
  actor: Doer,
  place: GaugePlace,
  input: NewForecast,
): Forecast {
  return change(work, actor, (deed) => {
    openProject(deed.tx, place.projectId)
    const gauge = gaugeAt(deed.tx, place)
    const forecastId = makeForecast(deed, gauge, input)
    const forecast = forecastAt(deed.tx, { ...place, forecastId })
    const { origin, issuedAt, crest } = forecast
    noteChange(deed, place.projectId, {
      ...subject(forecast, gauge),
      action: 'forecast.created',
      detail: { origin, issuedAt, crest },
    })
    return forecast
  })
}

/** An issue without its line in the audit trail, for whoever makes more than one. */
export function makeForecast(
  { tx, by, at }: Deed,
  gauge: Pick<Gauge, 'id' | 'name' | 'zero' | 'correction'>,
  input: NewForecast,
  id = randomUUID() as string,
): string {
  const { name, zero, correction } = gauge
  const { call, readings, observed: own } = levelsOfIssue(input, gauge)
  const observed = mergeObserved(findNewestObserved(tx, gauge.id), own)
  const { origin, issuedAt, note } = input
  insertForecast(tx, {
    ...{ id, gaugeId: gauge.id, origin, issuedAt, note, call, readings },
    gauge: { name, zero, correction },
    observed: observed.slice(-MOST_FORECAST_READINGS),
    ...answersOf({ readings, observed }),
    ...{ createdAt: at, createdBy: by.accountId },
  })
  return id
}

/**
 * Adds what was observed since the issue, which shifts every later hour of it.
 *
 * @throws OutOfRangeError, or ConflictError while the project is archived.
 */
export function addObserved(
  work: ProjectWork,
  actor: Doer,
  place: ForecastPlace,
  { reference, observed }: NewObserved,
): Forecast {
  return change(work, actor, (deed) => {
    openProject(deed.tx, place.projectId)
    const gauge = gaugeAt(deed.tx, place)
    const before = forecastAt(deed.tx, place)
    const seen = observedAtSite(observed, gauge, reference)
    const faults = observedFaults(seen)
    if (faults.length > 0) throw new OutOfRangeError(faults)
    const all = mergeObserved(before.observed, seen)
    assertCount(all.length)
    updateForecast(deed.tx, before.id, {
      observed: all,
      ...answersOf({ readings: before.readings, observed: all }),
    })
    const after = forecastAt(deed.tx, place)
    noteChange(deed, place.projectId, {
      ...subject(after, gauge),
      action: 'forecast.observed',
      detail: { readings: seen.length, last: seen.at(-1), shift: after.shift, crest: after.crest },
    })
    return after
  })
}

function assertCount(count: number): void {
  if (count <= MOST_FORECAST_READINGS) return
  const range = { min: 1, max: MOST_FORECAST_READINGS, unit: 'readings' }
  throw new OutOfRangeError([rangeFault('observed.length', count, range)])
}

/** What rests on the issue keeps its level; the audit trail keeps the crest. */
export function removeForecast(work: ProjectWork, actor: Doer, place: ForecastPlace): void {
  change(work, actor, (deed) => {
    openProject(deed.tx, place.projectId)
    const gauge = gaugeAt(deed.tx, place)
    const before = forecastAt(deed.tx, place)
    deleteForecast(deed.tx, before.id)
    const { origin, issuedAt, crest, readings, observed, note } = before
    noteChange(deed, place.projectId, {
      ...subject(before, gauge),
      action: 'forecast.deleted',
      detail: { origin, issuedAt, crest, note, readings: readings.length, seen: observed.length },
    })
  })
}

function forecastAt(db: Db, { gaugeId, forecastId }: ForecastPlace): Forecast {
  const forecast = findForecast(db, gaugeId, forecastId)
  if (!forecast) throw new NotFoundError(`forecast: "${forecastId}" does not exist at this gauge`)
  return forecast
}

const subject = ({ id }: Pick<Forecast, 'id'>, { name }: Pick<Gauge, 'name'>) => ({
  subjectType: 'forecast',
  subjectId: id,
  subjectName: name,
})
