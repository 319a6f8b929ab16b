import { describe, expect, it } from 'vitest'
import { FERRY_QUAY, ferryQuaySeed } from '../../../../server/demo/ferry-quay'
import { FERRY_QUAY_NOW, LOCK_ISSUE } from '../../../../server/demo/ferry-quay-forecast'
import { gapsOf, stretchesOf, valueAt } from '../../../../shared/calc/series/time-series'
import { dayTime } from '../../../../shared/forecast/project-time'
import { rateOfRiseAt } from '../../../../shared/forecast/rate-of-rise'
import { wholeSeries } from '../../../../shared/forecast/whole-series'
import { forecastSchema, forecastsSchema } from '../../../../shared/schemas/forecast'
import { gaugeSchema, scenarioSchema } from '../../../../shared/schemas/project'
import { as, NOON, projectServer } from '../../../support/project-server'

const HOUR = 3_600_000
const project = `/api/projects/${FERRY_QUAY.project}`
const lock = `${project}/gauges/${FERRY_QUAY.lockGauge}`
const path = `${lock}/forecasts`

function seeded() {
  const server = projectServer()
  ferryQuaySeed(() => NOON).run(server.db)
  return server
}

const at = Date.UTC(2031, 2, 3, 21, 45)

/** "Stage 2.86 at 07:00, ±0.12", with the stage of 22:00. */
const call = {
  origin: 'call',
  issuedAt: at + HOUR / 4,
  reference: 'stage',
  call: {
    levelNow: 1.78,
    at: FERRY_QUAY_NOW,
    crest: 2.86,
    margin: 0.12,
    crestAt: at + 9.25 * HOUR,
  },
}
const typed = (levels: readonly (number | null)[]) => ({
  origin: 'typed',
  issuedAt: at + HOUR,
  readings: levels.map((expected, hour) => ({ time: FERRY_QUAY_NOW + hour * HOUR, expected })),
})

const fieldsOf = (body: unknown) =>
  (body as { fields: { path: string }[] }).fields.map((field) => field.path)

describe('the forecast of Ferry Quay', () => {
  it('has its crest, its band and its gap', async () => {
    const { body } = await as(seeded(), 'viewer').get(`${path}/${LOCK_ISSUE.id}`).expect(200)
    const issue = forecastSchema.parse(body)
    const crest = { time: Date.UTC(2031, 2, 4, 7), expected: 3.42, low: 3.3, high: 3.54 }
    expect(issue.crest).toEqual({ ...crest, isReached: true })
    expect(issue.shift).toEqual({ at: FERRY_QUAY_NOW, shift: 0 })
    const series = wholeSeries(issue)
    // Half-hourly from midnight to midnight three days later: 3 × 48 + 1 readings.
    expect(series).toHaveLength(145)
    const [gap] = gapsOf(series)
    expect([dayTime(gap!.from * 1000, 'UTC'), dayTime(gap!.to * 1000, 'UTC')]).toEqual([
      'Mon 12:30',
      'Mon 15:00',
    ])
    // Straight between 2.68 at 01:00 and 2.84 at 02:00.
    expect(valueAt(series, Date.UTC(2031, 2, 4, 1, 30) / 1000)).toBe(2.76)
    expect(stretchesOf(series)).toHaveLength(2)
  })

  it('reaches the lowest ground at 01:41, and rises 0.13 m/h at 05:00', async () => {
    const { body } = await as(seeded(), 'viewer').get(`${path}/${LOCK_ISSUE.id}`).expect(200)
    const series = wholeSeries(forecastSchema.parse(body))
    const [, coming] = stretchesOf(series)
    const b = coming!.findIndex(({ value }) => value >= 2.79)
    const [before, after] = [coming![b - 1]!, coming![b]!]
    const share = (2.79 - before.value) / (after.value - before.value)
    const moment = before.time + share * (after.time - before.time)
    expect(dayTime(moment * 1000, 'UTC')).toBe('Tue 01:41')
    expect(rateOfRiseAt(series, 3.2)! * 3600).toBeCloseTo(0.13, 9)
  })
})

describe('forecasts of a gauge', () => {
  it('are drawn from a call, carried to the line, the newest first', async () => {
    const server = seeded()
    const lead = as(server, 'engineerA')
    const answer = await lead.post(path, call).expect(201)
    const sketch = forecastSchema.parse(answer.body)
    // Gauge zero 0.60 + stage 2.86 − 0.04 = 3.42, by hand.
    expect(sketch.crest).toMatchObject({ expected: 3.42, low: 3.3, high: 3.54 })
    expect(sketch.call).toMatchObject({ levelNow: 2.34, crest: 3.42 })
    expect(sketch.gauge).toEqual({ name: 'Lock', zero: 0.6, correction: -0.04 })
    // What was observed at the gauge goes along: 45 half hours until 22:00.
    expect(sketch.observed).toHaveLength(45)
    await lead.post(path, typed([2.34, 2.5, 2.4])).expect(201)
    const { forecasts } = forecastsSchema.parse((await lead.get(path).expect(200)).body)
    expect(forecasts.map(({ origin }) => origin)).toEqual(['typed', 'call', 'typed'])
    const newest = forecastsSchema.parse((await lead.get(`${project}/forecasts`)).body).forecasts
    expect(newest.map(({ id }) => id)).toEqual([forecasts[0]!.id])
  })

  it('keep the levels as they were issued when the gauge gets another zero', async () => {
    const server = seeded()
    const lead = as(server, 'engineerA')
    const made = forecastSchema.parse((await lead.post(path, call).expect(201)).body)
    const changed = await lead.patch(lock, { version: 1, zero: 0.7 }).expect(200)
    expect(gaugeSchema.parse(changed.body).zero).toBe(0.7)
    const kept = forecastSchema.parse((await lead.get(`${path}/${made.id}`)).body)
    expect(kept.crest!.expected).toBe(3.42)
    expect(kept.gauge.zero).toBe(0.6)
  })

  it('move with what is observed, and a moment observed again counts anew', async () => {
    const lead = as(seeded(), 'engineerB')
    const observed = `${path}/${LOCK_ISSUE.id}/observed`
    const time = FERRY_QUAY_NOW + HOUR
    // 2.43 is forecast for 23:00; a stage of 1.92 is 2.48 at the line.
    const first = { reference: 'stage', observed: [{ time, level: 1.92 }] }
    const moved = forecastSchema.parse((await lead.post(observed, first).expect(200)).body)
    expect(moved.shift!.at).toBe(time)
    expect(moved.shift!.shift).toBeCloseTo(0.05, 9)
    expect(moved.crest!.expected).toBeCloseTo(3.47, 9)
    expect(moved.crest!.high).toBeCloseTo(3.59, 9)
    const again = { observed: [{ time, level: 2.43 }] }
    const back = forecastSchema.parse((await lead.post(observed, again).expect(200)).body)
    expect(back.shift!.shift).toBeCloseTo(0, 9)
    expect(back.observed).toHaveLength(46)
  })

  it('are read by members, written by editors, and not there for anybody else', async () => {
    const server = seeded()
    await as(server, 'checker').get(path).expect(200)
    await as(server, 'checker').post(path, call).expect(403)
    await as(server, 'viewer').delete(`${path}/${LOCK_ISSUE.id}`).expect(403)
    await as(server, 'trainer').get(path).expect(404)
    await as(server, 'engineerB').delete(`${path}/${LOCK_ISSUE.id}`).expect(204)
    await as(server, 'engineerB').delete(`${path}/${LOCK_ISSUE.id}`).expect(404)
    await as(server, 'engineerA').get(`${project}/gauges/nowhere/forecasts`).expect(404)
    const other = `${project}/gauges/${FERRY_QUAY.boardGauge}/forecasts/${LOCK_ISSUE.id}`
    await as(server, 'engineerA').get(other).expect(404)
  })

  it('refuse what cannot be used, by its field', async () => {
    const lead = as(seeded(), 'engineerA')
    const lowCrest = { ...call, call: { ...call.call, crest: 1.5 } }
    const noWater = { ...typed([99_999]), reference: 'stage' }
    const cases = [
      ['call', 400, { ...call, call: null }],
      ['readings', 400, { ...call, readings: typed([1]).readings }],
      ['readings', 400, typed([])],
      ['origin', 400, { ...typed([1]), origin: 'guess' }],
      ['readings', 422, typed([null, null])],
      ['call.crest', 422, lowCrest],
      ['readings[0].expected', 422, noWater],
    ] as const
    for (const [field, status, body] of cases) {
      const answer = await lead.post(path, body).expect(status)
      expect(fieldsOf(answer.body)).toContain(field)
    }
    const { forecasts } = forecastsSchema.parse((await lead.get(path)).body)
    expect(forecasts.map(({ id }) => id)).toEqual([LOCK_ISSUE.id])
  })

  it('stay behind when a project is copied, and its scenarios keep their level', async () => {
    const lead = as(seeded(), 'engineerA')
    const scenario = `${project}/lines/${FERRY_QUAY.lowRoad}/scenarios/${FERRY_QUAY.lowRoad}-as-asked`
    const resting = scenarioSchema.parse((await lead.get(scenario).expect(200)).body)
    expect(resting.content.forecast).toMatchObject({ forecastId: LOCK_ISSUE.id, band: 'expected' })
    const copy = await lead.post(`${project}/duplicates`, { name: 'Copy' }).expect(201)
    const { id } = copy.body as { id: string }
    const list = await lead.get(`/api/projects/${id}/forecasts`).expect(200)
    expect(forecastsSchema.parse(list.body).forecasts).toEqual([])
  })
})
