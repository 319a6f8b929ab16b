import { z } from 'zod'

export { STATION_RANGES } from './station-ranges'

const metres = (meaning: string) => z.number().meta({ unit: 'm', description: meaning })

/** A surveyed point of a line. Surface and clear width count from here to the next station. */
export const stationSchema = z.strictObject({
  chainage: metres('Distance along the line'),
  x: metres('Easting in the local grid').nullable().default(null),
  y: metres('Northing in the local grid').nullable().default(null),
  groundLevel: metres('Ground level in the datum of the line'),
  surface: z.string().trim().min(1).max(40).meta({ description: 'Ground of the catalogue' }),
  clearWidth: metres('Clear width on the wet side').nullable().default(null),
  note: z.string().trim().max(200).default(''),
})
export type Station = z.output<typeof stationSchema>

/** Most stations that one line may have. */
export const MOST_STATIONS = 5000

/** The stations of a line, in order of chainage; without a survey there is one. */
export const stationsSchema = z.array(stationSchema).min(1).max(MOST_STATIONS)
