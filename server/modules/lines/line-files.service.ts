import { locatedStations } from '../../../shared/calc/line/line-path'
import { lineFileTexts } from '../../../shared/texts/line-file.en'
import type { Db } from '../../db/client'
import { ConflictError } from '../../errors'
import { toCsv } from '../../http/csv'
import { noProject } from '../projects/open-project'
import { findProject } from '../projects/projects.queries'
import { lineAt, type LinePlace } from './open-line'

const COLUMNS = ['chainage', 'x', 'y', 'groundLevel', 'surface', 'clearWidth', 'note'] as const

function placed(db: Db, place: LinePlace) {
  const project = findProject(db, place.projectId)
  if (!project) throw noProject(place.projectId)
  return { datum: project.datum, line: lineAt(db, place) }
}

/** The survey as a file for a spreadsheet, which our own import reads back; the datum in its heading. */
export function surveyAsCsv(db: Db, place: LinePlace): string {
  const { datum, line } = placed(db, place)
  const heading = COLUMNS.map((column) => lineFileTexts.heading[column].replace('{datum}', datum))
  return toCsv([
    heading,
    ...line.stations.map((station) => COLUMNS.map((column) => station[column])),
  ])
}

/**
 * The line, its stations and marks as GeoJSON. Coordinates are those of the local grid: RFC 7946 wants
 * WGS 84 unless both sides agree on something else, so the file says what it holds. Levels are
 * properties, because a third coordinate would be a height above the ellipsoid.
 *
 * @throws ConflictError for a line without two places in the grid.
 */
export function lineAsGeoJson(db: Db, place: LinePlace): object {
  const { datum, line } = placed(db, place)
  const path = locatedStations(line.stations)
  if (path.length < 2) {
    throw new ConflictError(`The line "${line.name}" has no plan: its survey has no x and y.`)
  }
  const stations = line.stations.filter(({ x, y }) => x !== null && y !== null)
  return {
    type: 'FeatureCollection',
    name: line.name,
    coordinateReference: {
      isWgs84: false,
      identifier: null,
      unit: 'm',
      statement: `${lineFileTexts.grid} ${lineFileTexts.notWgs84}`,
    },
    verticalDatum: datum,
    features: [
      feature(
        'LineString',
        path.map(({ x, y }) => [x, y]),
        {
          kind: 'line',
          name: line.name,
          sectionLength: line.sectionLength,
          ends: line.ends,
          marks: line.marks,
        },
      ),
      ...stations.map(({ x, y, ...station }) =>
        feature('Point', [x, y], { kind: 'station', ...station }),
      ),
    ],
  }
}

function feature(type: 'LineString' | 'Point', coordinates: unknown, properties: object) {
  return { type: 'Feature', geometry: { type, coordinates }, properties }
}
