// @vitest-environment jsdom
import { describe, expect, it } from 'vitest'
import {
  levelsOfSeries,
  looksLikeXml,
  readWaterml,
  type WaterSeries,
} from '@/forecast/read-waterml'

/** Structure after OGC 10-126r4, WaterML 2.0 part 1, clause 9 and its example of a time series. */
const document = (points: string, uom = '<wml2:uom code="m"/>') => `<?xml version="1.0"?>
<wml2:Collection xmlns:wml2="http://www.opengis.net/waterml/2.0"
  xmlns:om="http://www.opengis.net/om/2.0" xmlns:gml="http://www.opengis.net/gml/3.2"
  xmlns:xlink="http://www.w3.org/1999/xlink" xmlns:xsi="http://www.w3.org/2001/XMLSchema-instance">
<wml2:observationMember><om:OM_Observation gml:id="o1">
<om:observedProperty xlink:href="urn:level" xlink:title="Water level, expected"/>
<om:result><wml2:MeasurementTimeseries gml:id="ts1">
<wml2:defaultPointMetadata><wml2:DefaultTVPMeasurementMetadata>${uom}
</wml2:DefaultTVPMeasurementMetadata></wml2:defaultPointMetadata>
${points}
</wml2:MeasurementTimeseries></om:result></om:OM_Observation></wml2:observationMember>
</wml2:Collection>`

const point = (time: string, rest: string) =>
  `<wml2:point><wml2:MeasurementTVP><wml2:time>${time}</wml2:time>${rest}</wml2:MeasurementTVP></wml2:point>`
const value = (text: string) => `<wml2:value>${text}</wml2:value>`

const GOOD = [
  point('2031-03-03T22:00:00Z', value('2.34')),
  point('2031-03-03T23:00:00Z', '<wml2:value xsi:nil="true"/>'),
  point(
    '2031-03-04T01:00:00+01:00',
    `${value('2.54')}<wml2:metadata><wml2:TVPMeasurementMetadata><wml2:censoredReason xlink:href="urn:below"/></wml2:TVPMeasurementMetadata></wml2:metadata>`,
  ),
  point('2031-03-04T01:00:00Z', value('2.68')),
].join('\n')

const how = { zone: '', dateOrder: 'dmy' } as const
const one = (text: string) => (readWaterml(text) as readonly WaterSeries[])[0]!

describe('a WaterML document', () => {
  it('has its series with name, unit and points; nil and censored ones are gaps', () => {
    const series = one(document(GOOD))
    expect(series).toMatchObject({ name: 'Water level, expected', uom: 'm', unit: 'm' })
    expect(levelsOfSeries(series, 'm', how)).toEqual({
      faults: [],
      levels: [
        { time: Date.UTC(2031, 2, 3, 22), level: 2.34 },
        { time: Date.UTC(2031, 2, 3, 23), level: null },
        { time: Date.UTC(2031, 2, 4, 0), level: null },
        { time: Date.UTC(2031, 2, 4, 1), level: 2.68 },
      ],
    })
  })

  it.each([
    ['<wml2:uom code="cm"/>', 'cm'],
    ['<wml2:uom code="[ft_i]"/>', 'ft'],
    ['<wml2:uom xlink:href="http://units.test/def#ft"/>', 'ft'],
    ['<wml2:uom code="K"/>', null],
    ['', null],
  ])('says its unit by %s', (uom, unit) => {
    expect(one(document(GOOD, uom)).unit).toBe(unit)
  })

  it('tells faults by the line of their point', () => {
    const bad = [
      point('2031-03-03T22:00:00Z', value('2.34')),
      point('2031-03-03T22:00:00Z', value('2.35')),
      point('2031-03-03T23:00:00', value('high')),
    ].join('\n')
    // The points begin on line 10 of the document.
    const { faults } = levelsOfSeries(one(document(bad)), 'm', how)
    expect(faults).toEqual([
      { kind: 'moment-twice', line: 11, cell: '2031-03-03T22:00:00Z' },
      { kind: 'no-offset', line: 12, cell: '2031-03-03T23:00:00' },
      { kind: 'text', line: 12, cell: 'high' },
    ])
  })

  it('is refused with entities, before it is read', () => {
    const bomb = `<!DOCTYPE b [<!ENTITY a "aa"><!ENTITY b "&a;&a;">]>${document(GOOD)}`
    expect(readWaterml(bomb)).toBe('entities')
    expect(readWaterml('<!doctype x SYSTEM "file:///etc/passwd"><x/>')).toBe('entities')
  })

  it('is refused where it is no XML, no WaterML, or without points', () => {
    expect(readWaterml('<a><b></a>')).toBe('not-xml')
    expect(readWaterml('<html><body/></html>')).toBe('not-waterml')
    expect(readWaterml(document(''))).toBe('no-points')
    expect([looksLikeXml('  <a/>'), looksLikeXml('time,level')]).toEqual([true, false])
  })
})
