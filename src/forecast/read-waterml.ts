import { isInRange } from '@shared/errors'
import { STATION_RANGES } from '@shared/schemas/station-ranges'
import { MOST_FORECAST_READINGS } from '@shared/schemas/forecast'
import { inMetres, type LevelUnit } from './forecast-rows'
import { readMoment, type MomentChoice, type MomentFault } from './read-moment'

/** A series of a file, as it stands there. */
export interface WaterSeries {
  readonly name: string
  /** Unit as the file writes it. */
  readonly uom: string
  readonly unit: LevelUnit | null
  readonly points: readonly WaterPoint[]
}

export interface WaterPoint {
  readonly line: number
  readonly time: string
  /** null: nil, censored or empty. */
  readonly value: string | null
  readonly isCensored: boolean
}

/** Why a text is no WaterML that can be read. */
export type WaterFault = 'entities' | 'not-xml' | 'not-waterml' | 'no-points'

/** OGC 10-126r4, WaterML 2.0 part 1: namespace of time series. */
const WML2 = 'http://www.opengis.net/waterml/2.0'
const XLINK = 'http://www.w3.org/1999/xlink'
const XSI = 'http://www.w3.org/2001/XMLSchema-instance'

/** True for a text that begins as XML does. */
export function looksLikeXml(text: string): boolean {
  return /^\uFEFF?\s*</.test(text)
}

/**
 * Series of levels of a WaterML 2.0 document. A document with a type declaration or entities is refused
 * before it is read: nothing of that kind belongs into one.
 */
export function readWaterml(text: string): readonly WaterSeries[] | WaterFault {
  if (/<!\s*(doctype|entity)/i.test(text)) return 'entities'
  const document = new DOMParser().parseFromString(text.replace(/^\uFEFF/, ''), 'application/xml')
  if (document.getElementsByTagName('parsererror').length > 0) return 'not-xml'
  const found = [...document.getElementsByTagNameNS(WML2, 'MeasurementTimeseries')]
  if (found.length === 0) return 'not-waterml'
  const lines = linesOf(text)
  let before = 0
  const series = found.map((element, i) => {
    const points = [...element.getElementsByTagNameNS(WML2, 'MeasurementTVP')]
    const own = seriesOf(element, points, lines.slice(before))
    before += points.length
    return own.name === '' ? { ...own, name: String(i + 1) } : own
  })
  return series.some(({ points }) => points.length > 0) ? series : 'no-points'
}

/** Lines of the points, in the order of the document; a parsed document no longer knows them. */
function linesOf(text: string): readonly number[] {
  const lines: number[] = []
  let line = 1
  let from = 0
  for (const { index } of text.matchAll(/<(?:[\w.-]+:)?MeasurementTVP[\s>/]/g)) {
    for (; from < index; from += 1) if (text.charCodeAt(from) === 10) line += 1
    lines.push(line)
  }
  return lines
}

function seriesOf(
  element: Element,
  points: readonly Element[],
  lines: readonly number[],
): WaterSeries {
  const uomElement = element.getElementsByTagNameNS(WML2, 'uom')[0]
  const uom = uomElement?.getAttribute('code') ?? uomElement?.getAttributeNS(XLINK, 'href') ?? ''
  return {
    name: nameOf(element),
    uom,
    unit: unitOf(uom),
    points: points.map((point, i) => pointOf(point, lines[i] ?? 0)),
  }
}

/** What the observation that holds the series calls itself or what it observes. */
function nameOf(element: Element): string {
  const observation = parentNamed(element, 'OM_Observation')
  const property = observation && [...observation.children].find(isNamed('observedProperty'))
  const title = property?.getAttributeNS(XLINK, 'title') ?? property?.getAttributeNS(XLINK, 'href')
  const id = element.getAttributeNS('http://www.opengis.net/gml/3.2', 'id')
  return (title || id || '').trim()
}

const isNamed = (name: string) => (element: Element) => element.localName === name

function parentNamed(element: Element, name: string): Element | null {
  let parent = element.parentElement
  while (parent && parent.localName !== name) parent = parent.parentElement
  return parent
}

/** Codes after UCUM, with and without brackets, and words that files use instead. */
function unitOf(uom: string): LevelUnit | null {
  const word = uom
    .toLowerCase()
    .replace(/^.*[/#:]/, '')
    .replace(/[[\]_]/g, '')
  if (['m', 'meter', 'metre', 'meters', 'metres'].includes(word)) return 'm'
  if (['cm', 'centimeter', 'centimetre'].includes(word)) return 'cm'
  if (['mm', 'millimeter', 'millimetre'].includes(word)) return 'mm'
  return ['ft', 'fti', 'foot', 'feet'].includes(word) ? 'ft' : null
}

function pointOf(point: Element, line: number): WaterPoint {
  const one = (name: string) => point.getElementsByTagNameNS(WML2, name)[0]
  const value = one('value')
  const isNil = value?.getAttributeNS(XSI, 'nil') === 'true' || one('nilReason') !== undefined
  const isCensored = one('censoredReason') !== undefined
  const text = value?.textContent?.trim() ?? ''
  return {
    line,
    time: one('time')?.textContent?.trim() ?? '',
    value: isNil || isCensored || text === '' ? null : text,
    isCensored,
  }
}

export type WaterPointFault =
  MomentFault | 'text' | 'range' | 'moment-twice' | 'backwards' | 'too-many'

/** A fault of a point, by its line in the file. */
export interface PointFault {
  readonly kind: WaterPointFault
  readonly line: number
  readonly cell: string
}

export interface LevelPoint {
  readonly time: number
  readonly level: number | null
}

/** Levels of a series in metres, or its faults: every point that cannot be read. */
export function levelsOfSeries(
  { points }: WaterSeries,
  unit: LevelUnit,
  choice: MomentChoice,
): { readonly levels: readonly LevelPoint[]; readonly faults: readonly PointFault[] } {
  const faults: PointFault[] = []
  if (points.length > MOST_FORECAST_READINGS) {
    const { line } = points[MOST_FORECAST_READINGS]!
    return { levels: [], faults: [{ kind: 'too-many', line, cell: String(points.length) }] }
  }
  let before = -Infinity
  const levels = points.map(({ line, time: text, value }): LevelPoint => {
    const time = readMoment(text, choice)
    if (typeof time === 'string') faults.push({ kind: time, line, cell: text })
    else if (time <= before) {
      faults.push({ kind: time === before ? 'moment-twice' : 'backwards', line, cell: text })
    } else before = time
    const level = value === null ? null : inMetres(Number(value), unit)
    if (level !== null && !Number.isFinite(level)) faults.push({ kind: 'text', line, cell: value! })
    else if (level !== null && !isInRange(level, STATION_RANGES.groundLevel)) {
      faults.push({ kind: 'range', line, cell: value! })
    }
    return { time: typeof time === 'string' ? NaN : time, level }
  })
  return faults.length > 0 ? { levels: [], faults } : { levels, faults }
}
