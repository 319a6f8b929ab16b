import { describe, expect, it } from 'vitest'
import {
  BEHIND_THE_KERB_STATIONS,
  LOW_ROAD_STATIONS,
} from '../../../../server/demo/ferry-quay-lines'
import { LOW_ROAD_SCENARIOS } from '../../../../server/demo/ferry-quay-scenarios'
import { laidSections, layoutBill } from '../../../../shared/checks/layout/layout-bill'
import {
  lineFigures,
  replacedStretch,
  stretchOf,
} from '../../../../shared/checks/layout/line-figures'
import { overrideCost } from '../../../../shared/checks/layout/override-cost'
import { TUBES } from '../../../support/tubes'

const LINE = { stations: LOW_ROAD_STATIONS, sectionLength: 10 }
const KERB = { stations: BEHIND_THE_KERB_STATIONS, sectionLength: 10 }
const { content } = LOW_ROAD_SCENARIOS[1]!

describe('two lines side by side', () => {
  it('are compared where one leaves the other and meets it again', () => {
    expect(replacedStretch(LINE.stations, KERB.stations)).toEqual({ from: 30, to: 70 })
    const far = KERB.stations.map((row) => ({ ...row, y: row.y! + 50 }))
    expect(replacedStretch(LINE.stations, far)).toBeNull()
  })

  it('behind the kerb is shorter, on higher ground, and holds', () => {
    const here = lineFigures(stretchOf(LINE, 30, 70), content, TUBES)
    const behind = lineFigures(KERB, content, TUBES)
    expect([here.length, behind.length]).toEqual([40, 32.31])
    expect([here.lowestGround, behind.lowestGround]).toEqual([2.79, 2.87])
    expect([here.verdict, behind.verdict]).toEqual(['fails', 'narrow'])
  })

  it('may begin between two stations', () => {
    const { stations } = stretchOf(LINE, 42.5, 65)
    expect(stations.map(({ chainage }) => chainage)).toEqual([42.5, 45, 50, 60, 65])
    expect(stations[0]!.groundLevel).toBeCloseTo(2.91, 12)
    expect(stations[0]!.x).toBeCloseTo(42.35, 12)
    expect(stations[4]!.surface).toBe('turf')
  })
})

it('a size laid by hand costs what the bills of both layouts differ by', () => {
  const laid = laidSections(LINE, content)
  const run = { ...laid[5]!.run!, from: 50, to: 60, barrier: TUBES[1]! }
  const other = { ...content, sizes: [...content.sizes, run] }
  const [with100, with70] = [content, other].map((sizes) => layoutBill(LINE, sizes))
  const cost = overrideCost(laid, 5, TUBES[1]!, 10)
  expect(cost.mass).toBeCloseTo(with100!.weight - with70!.weight, 9)
  expect(cost.crewTime).toBeCloseTo(with100!.crewTime - with70!.crewTime, 9)
})
