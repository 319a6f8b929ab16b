import { describe, expect, it } from 'vitest'
import { checkSection } from '../../../shared/checks/section-check'
import { parseSectionCase } from '../../../shared/schemas/parse-section-case'
import sections from '../../golden/section.json'
import { expectClose } from '../../support/close-to'

// Worked cases of the method, computed by two independent programs (derived, not published).
interface Golden {
  readonly note?: string
  readonly case: Record<string, unknown>
  readonly expected: Record<string, unknown>
}

/** Bounds of the contract: loaded shape 1e-8, holds-to 1e-4 m, everything else 1e-9. */
function boundOf(path: string): number {
  return path.startsWith('loadedShape') ? 1e-8 : 1e-9
}

function compareAt(path: string, actual: unknown, expected: unknown): void {
  if (path === 'holdsTo.depth' || path === 'holdsTo.from') {
    if (expected === null) expect(actual, path).toBeNull()
    else expect(Math.abs((actual as number) - (expected as number)), path).toBeLessThanOrEqual(1e-4)
  } else if (typeof expected === 'number') {
    expect(typeof actual, path).toBe('number')
    expectClose(actual as number, expected, boundOf(path), path)
  } else if (typeof expected === 'object' && expected !== null) {
    for (const [key, value] of Object.entries(expected)) {
      const inner = path === '' ? key : `${path}.${key}`
      compareAt(inner, (actual as Record<string, unknown>)[key], value)
    }
  } else {
    expect(actual, path).toBe(expected)
  }
}

function titleOf({ note, case: input }: Golden, index: number): string {
  const { barrier, water, uplift, basis } = input as Record<string, Record<string, unknown>>
  const facts = `D ${barrier!.diameter} m, h ${water!.depth} m, ${uplift!.model}, ${String(basis)}`
  return `case ${index}: ${note ?? facts}`
}

describe('worked sections', () => {
  const cases = sections as Golden[]
  it.each(cases.map((golden, index) => [titleOf(golden, index), golden] as const))(
    '%s',
    (_title, golden) => {
      const result = checkSection(parseSectionCase(golden.case))
      compareAt('', result, golden.expected)
    },
  )
})
