import { spawnSync } from 'node:child_process'

export interface CalcAnswer {
  readonly verdict: string
  readonly holdsTo: { readonly from: number | null; readonly depth: number; readonly check: string }
}

/** The default case of the Quick check, as the batch command takes it. */
export const DEFAULT_SECTION = {
  barrier: {
    diameter: 0.7,
    skirtLength: 2.2,
    contactWidth: 0.12,
    mass: 4.8,
    airPressure: 15_000,
    sectionLength: 10,
    fabricStrength: 60_000,
  },
  ground: { friction: 0.45 },
  water: { depth: 0.42 },
  uplift: { model: 'linear', edgeFactor: 1 },
  basis: 'global-1.5',
}

/** What `npm run --silent calc -- section` answers. */
export function calcSection(section: object): CalcAnswer {
  const { stdout, stderr, status } = spawnSync(
    'npm',
    ['run', '--silent', 'calc', '--', 'section'],
    {
      input: JSON.stringify(section),
      encoding: 'utf8',
    },
  )
  if (status !== 0) throw new Error(`calc section ended with ${status}: ${stderr}`)
  return JSON.parse(stdout) as CalcAnswer
}
