import { describe, expect, it } from 'vitest'
import { deploymentPlan } from '../../../shared/deployment/deployment-plan'
import { layingTimelineScene } from '../../../shared/drawing/laying-timeline'
import { timelineFrame } from '../../../shared/drawing/laying-timeline/timeline-frame'
import type { PathItem, TextItem } from '../../../shared/drawing/scene'
import { dayTime } from '../../../shared/forecast/project-time'
import { ferryQuayInput } from '../deployment/ferry-quay-input'

const input = (width: number, order: 'from-start' | 'outward' = 'from-start') => ({
  plan: deploymentPlan(ferryQuayInput({ order })),
  width,
  dayTime: (moment: number) => dayTime(moment, 'UTC'),
  clockOffset: 0,
})
const texts = (scene: ReturnType<typeof layingTimelineScene>) =>
  scene.items.filter((item): item is TextItem => item.kind === 'text')
const path = (scene: ReturnType<typeof layingTimelineScene>, id: string) =>
  scene.items.find((item): item is PathItem => item.kind === 'path' && item.id === id)

describe('timeline of a deployment', () => {
  it.each([390, 760, 1200])('keeps its texts within a width of %i', (width) => {
    const scene = layingTimelineScene(input(width))
    for (const { x, y } of texts(scene)) {
      expect(x).toBeGreaterThanOrEqual(0)
      expect(x).toBeLessThanOrEqual(width)
      expect(y).toBeLessThanOrEqual(scene.height)
    }
  })

  it('has the hours of the time axis in proportion, and ticks at whole steps of the clock', () => {
    const { plan } = input(900)
    const frame = timelineFrame(input(900))
    const half = (plan.decidedAt + plan.finish) / 2
    expect(frame.toX(half)).toBeCloseTo((frame.toX(plan.decidedAt) + frame.toX(plan.finish)) / 2, 6)
    for (const tick of frame.ticks) expect(tick % (15 * 60_000)).toBe(0)
    const shifted = timelineFrame({ ...input(900), clockOffset: 345 * 60_000 })
    for (const tick of shifted.ticks) expect((tick + 345 * 60_000) % (15 * 60_000)).toBe(0)
  })

  it('draws a bar for each section twice, and its filling', () => {
    const scene = layingTimelineScene(input(900))
    const bars = (id: string) => path(scene, id)!.d.split('Z').length - 1
    const { sections } = input(900).plan
    const waiting = sections.filter(({ steps }) => steps.some(({ waited }) => waited > 0)).length
    expect(bars('fills')).toBe(2 * sections.length)
    // A wait parts a bar in two.
    expect(bars('work')).toBe(2 * (sections.length + waiting))
  })

  it('marks what is late, and nothing where all are in time', () => {
    expect(path(layingTimelineScene(input(900)), 'late')).toBeDefined()
    expect(path(layingTimelineScene(input(900, 'outward')), 'late')).toBeUndefined()
    const late = texts(layingTimelineScene(input(900))).find(({ id }) => id === 'margin-15')!
    expect(late).toMatchObject({
      role: 'labelFails',
      message: { key: 'deployment.drawing.late', values: { minutes: 1 } },
    })
  })

  it('says in sentences what it shows', () => {
    const { description } = layingTimelineScene(input(900))
    expect(description.map(({ key }) => key)).toEqual([
      'deployment.drawing.describe.work',
      'deployment.drawing.describe.late',
    ])
    expect(description[0]!.values).toMatchObject({ pairs: 2, sections: 18, from: 'Mon 23:40' })
  })
})
