import { describe, expect, it } from 'vitest'
import { lineSections } from '../../../shared/calc/line/line-sections'
import { sandbagsPerMetre, sandbagWall } from '../../../shared/deployment/sandbag-wall'
import { OutOfRangeError } from '../../../shared/errors'

const FOOT = 0.3048

describe('sandbags in place of the barrier', () => {
  // NDSU Extension AE-626, Sandbagging for Flood Protection, 2011 edition, table: bags for 100 ft.
  it.each([
    [1, 600],
    [2, 2100],
    [3, 4500],
    [4, 7800],
  ])('takes for %i ft of height %i bags for 100 ft', (feet, bags) => {
    expect(sandbagsPerMetre(feet * FOOT) * 100 * FOOT).toBeCloseTo(bags, 6)
  })

  it.each([-0.1, 3.1, Number.NaN])('refuses a height of %s m', (height) => {
    expect(() => sandbagsPerMetre(height)).toThrow(OutOfRangeError)
  })

  const line = (ground: number) =>
    lineSections(
      [0, 20].map((chainage) => ({
        ...{ chainage, x: null, y: null, groundLevel: ground, surface: 'turf' },
        ...{ clearWidth: null, note: '' },
      })),
      10,
    )

  it('stands one foot above the water, twelve bags in a person-hour', () => {
    // Same source: 1 ft above the crest; 12 bags per person and hour. 1 ft of water: H = 2 ft.
    const wall = sandbagWall(line(3 - FOOT), 3)!
    expect(wall.bags).toBe(Math.ceil((21 / FOOT) * 20))
    expect(wall.personTime).toBeCloseTo((wall.bags / 12) * 3600, 6)
    expect(wall.isBeyondTable).toBe(false)
  })

  it('needs nothing a foot above the water, and says where it leaves the table', () => {
    expect(sandbagWall(line(3 + FOOT), 3)).toMatchObject({ bags: 0, length: 0 })
    expect(sandbagWall(line(3 + FOOT / 2), 3)!.isBeyondTable).toBe(true)
    expect(sandbagWall(line(0), 3)).toBeNull()
  })
})
