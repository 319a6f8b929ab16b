import { describe, expect, it } from 'vitest'
import { deviceOf } from '../../../../src/components/account/device'
import { timeZones } from '../../../../src/components/account/time-zones'
import { dayEnd, dayStart } from '../../../../src/components/admin/day-range'
import { safeNext } from '../../../../src/composables/useNextPage'

describe('the page after the sign-in', () => {
  it.each(['/desk', '/projects/1?page=2#lines', '/'])('may be %s', (path) => {
    expect(safeNext(path)).toBe(path)
  })

  it.each([
    ['another site', 'https://elsewhere.invalid/'],
    ['another site without its scheme', '//elsewhere.invalid'],
    ['another site with a backslash', '/\\elsewhere.invalid'],
    ['a script', 'javascript:alert(1)'],
    ['nothing', undefined],
    ['several', ['/a', '/b']],
  ])('is never %s', (_what, next) => {
    expect(safeNext(next)).toBe('/desk')
  })
})

it.each([
  [
    'Mozilla/5.0 (Windows NT 10.0) AppleWebKit/537.36 Chrome/140 Safari/537.36 Edg/140',
    'Edge',
    'Windows',
  ],
  ['Mozilla/5.0 (X11; Linux x86_64; rv:140.0) Gecko/20100101 Firefox/140.0', 'Firefox', 'Linux'],
  [
    'Mozilla/5.0 (Linux; Android 15) AppleWebKit/537.36 Chrome/140 Mobile Safari/537.36',
    'Chrome',
    'Android',
  ],
  ['Mozilla/5.0 (Macintosh; Intel Mac OS X 10_15) Version/18 Safari/605', 'Safari', 'macOS'],
])('a session opened with %s is known by browser and system', (userAgent, browser, system) => {
  expect(deviceOf(userAgent)).toEqual({ browser, system })
})

it('a session of a program is of an unknown browser', () => {
  expect(deviceOf('curl/8.5.0')).toBeNull()
})

it('time zones name UTC once, and many others', () => {
  expect(timeZones().filter((zone) => zone === 'UTC')).toHaveLength(1)
  expect(timeZones().length).toBeGreaterThan(300)
})

describe('a day of the audit trail', () => {
  it('reaches from its first to its last millisecond', () => {
    expect(dayStart('2026-06-01')).toBe(new Date(2026, 5, 1).getTime())
    expect(dayEnd('2026-06-01')).toBe(new Date(2026, 5, 2).getTime() - 1)
  })

  it('is open where no day is chosen', () => {
    expect([dayStart(''), dayEnd('')]).toEqual([undefined, undefined])
  })
})
