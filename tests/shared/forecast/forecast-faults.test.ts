import { describe, expect, it } from 'vitest'
import { forecastFaults, observedFaults } from '../../../shared/forecast/forecast-faults'
import { restState, takenOver } from '../../../shared/forecast/rests-on'
import type { ForecastReading } from '../../../shared/schemas/forecast'

const HOUR = 3_600_000
const issuedAt = Date.UTC(2031, 2, 3, 21, 45)
const readings = [0, 1, 2].map((hour) => ({
  time: issuedAt + hour * HOUR,
  expected: 2 + hour / 10,
  low: 1.9 + hour / 10,
  high: 2.1 + hour / 10,
}))
const paths = (change: Partial<Parameters<typeof forecastFaults>[0]>) =>
  forecastFaults({ readings, observed: [], issuedAt, ...change }).map(({ path }) => path)
const changed = (index: number, change: Partial<ForecastReading>) =>
  readings.map((reading, i) => (i === index ? { ...reading, ...change } : reading))

describe('the readings of an issue', () => {
  it('are taken as they should be', () => {
    expect(paths({})).toEqual([])
    expect(paths({ observed: [{ time: issuedAt, level: 2 }] })).toEqual([])
  })

  it.each([
    ['a moment twice', changed(1, { time: issuedAt }), 'readings[1].time'],
    ['a moment backwards', changed(2, { time: issuedAt + HOUR / 2 }), 'readings[2].time'],
    ['seconds for milliseconds', changed(0, { time: 9e15 }), 'readings[0].time'],
    ['a level in millimetres', changed(1, { expected: 9001, high: null }), 'readings[1].expected'],
    ['a low level above the expected', changed(1, { low: 2.5 }), 'readings[1].low'],
    ['a high level below it', changed(1, { high: 1.5 }), 'readings[1].high'],
  ])('refuse %s', (_case, wrong, path) => {
    expect(paths({ readings: wrong })).toContain(path)
  })

  it('refuse nothing but gaps', () => {
    const gaps = readings.map(({ time }) => ({ time, expected: null, low: null, high: null }))
    expect(paths({ readings: gaps })).toContain('readings')
  })

  it('refuse observed levels out of order by their own path', () => {
    const observed = [
      { time: issuedAt, level: 2 },
      { time: issuedAt, level: 2.1 },
    ]
    expect(observedFaults(observed).map(({ path }) => path)).toEqual(['observed[1].time'])
  })
})

describe('what rests on an issue', () => {
  const old = { id: 'a', issuedAt, shift: null }
  const fresh = { id: 'b', issuedAt: issuedAt + HOUR, shift: null }
  const resting = {
    gaugeId: 'g',
    forecastId: 'a',
    issuedAt,
    band: 'expected' as const,
    shiftedAt: null,
  }

  it('is current while the issue is the newest', () => {
    expect(restState(resting, old)).toBe('current')
  })

  it('is older where a newer issue is there', () => {
    expect(restState(resting, fresh)).toBe('newer-issue')
  })

  it('is older where an observed level shifted the issue since', () => {
    const shifted = { ...old, shift: { at: issuedAt + HOUR, shift: 0.05 } }
    expect(restState(resting, shifted)).toBe('newer-observed')
    expect(restState({ ...resting, shiftedAt: issuedAt + HOUR }, shifted)).toBe('current')
  })

  it('says when the issue is gone, whether or not an older one is left', () => {
    expect(restState(resting, undefined)).toBe('gone')
    expect(restState(resting, { ...old, id: 'z', issuedAt: issuedAt - HOUR })).toBe('gone')
  })
})

describe('taking over an issue', () => {
  const crest = { time: issuedAt, expected: 3.42, low: 3.3, high: null, isReached: true }
  const issue = { id: 'a', gaugeId: 'g', issuedAt, shift: { at: issuedAt, shift: 0.02 }, crest }

  it('makes its crest the level, with the band beside it', () => {
    expect(takenOver(issue, 'low')).toEqual({
      forecast: { gaugeId: 'g', forecastId: 'a', issuedAt, band: 'low', shiftedAt: issuedAt },
      waterLevel: 3.3,
      levelLow: 3.3,
      levelHigh: null,
    })
  })

  it('is not possible with a band, or a level, that is not there', () => {
    expect(takenOver(issue, 'high')).toBeNull()
    expect(takenOver({ ...issue, crest: null }, 'expected')).toBeNull()
  })
})
