/** Headings and sentences in the files of a line; they are read by people and by programs. */
export const lineFileTexts = {
  heading: {
    chainage: 'Chainage (m)',
    x: 'x (m)',
    y: 'y (m)',
    groundLevel: 'Ground level (m, {datum})',
    surface: 'Surface',
    clearWidth: 'Clear width (m)',
    note: 'Note',
  },
  grid: 'Local grid of the project, in metres; its coordinate reference system is not known.',
  notWgs84:
    'Coordinates are not WGS 84 longitude and latitude, which RFC 7946 asks for: use them only with whoever knows the grid.',
} as const
