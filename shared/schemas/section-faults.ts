import { isInRange, rangeFault, type Fault } from '../errors'
import type { SectionCase } from './section-case'
import { NUMERIC_PATHS, resolveRange, fieldRange, type NumericPath } from './section-ranges'

/** Fields that a choice elsewhere makes necessary, and what asks for them. */
const NEEDED_WITH = [
  {
    path: 'water.wavePeriod',
    because: 'required with waves',
    isAsked: (section: SectionCase) => section.water.waveHeight > 0,
  },
  {
    path: 'uplift.diffusivity',
    because: 'required for developing uplift',
    isAsked: (section: SectionCase) => section.uplift.model === 'developing',
  },
  {
    path: 'uplift.time',
    because: 'required for developing uplift',
    isAsked: (section: SectionCase) => section.uplift.model === 'developing',
  },
  {
    path: 'ground.layerThickness',
    because: 'required with permeability',
    isAsked: (section: SectionCase) => section.ground.permeability !== null,
  },
] as const satisfies readonly {
  path: NumericPath
  because: string
  isAsked: (section: SectionCase) => boolean
}[]

/** The value at a path of a case; the empty path is the case itself. */
export function valueAt(section: object, path: string): unknown {
  if (path === '') return section
  return path
    .split('.')
    .reduce<unknown>((node, key) => (node as Record<string, unknown> | undefined)?.[key], section)
}

/** True where the default stands in: nothing at all, or no quantity where there need not be one. */
function isLeftOut(value: unknown, fallback: number | null | undefined): boolean {
  return value === undefined ? fallback !== undefined : value === null && fallback === null
}

/**
 * Everything in a case that lies outside its range or is missing where a choice asks for it. An
 * empty list: the case can be computed.
 */
export function sectionFaults(section: SectionCase): readonly Fault[] {
  const read = (path: NumericPath): unknown => valueAt(section, path)
  const outside = NUMERIC_PATHS.flatMap((path) => {
    const value = read(path)
    if (isLeftOut(value, fieldRange(path).default)) return []
    const range = resolveRange(path, read)
    return isInRange(value as number, range) ? [] : [rangeFault(path, value, range)]
  })
  const missing = NEEDED_WITH.filter(
    ({ path, isAsked }) => read(path) === null && isAsked(section),
  ).map(({ path, because }) => {
    const fault = rangeFault(path, null, resolveRange(path, read))
    return { ...fault, message: `${fault.message} (${because})` }
  })
  return [...outside, ...missing]
}
