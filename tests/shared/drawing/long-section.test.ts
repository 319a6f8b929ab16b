import { describe, expect, it } from 'vitest'
import { LOW_ROAD_STATIONS } from '../../../server/demo/ferry-quay-lines'
import { checkLine } from '../../../shared/checks/line-check'
import {
  longSectionScene,
  readLongSection,
  type LongSectionInput,
} from '../../../shared/drawing/long-section'
import { boxesMeet, textBox } from '../../../shared/drawing/label-placer'
import { sceneToSvg } from '../../../shared/drawing/scene-to-svg'
import { measureWith } from '../../../shared/drawing/text-width'
import { texts } from '../../../shared/texts'
import { textResolver } from '../../../shared/texts/format-text'
import { areaTexts } from '../../../shared/texts/member-area'
import { drawnScenario, drawnSurvey } from '../../../src/line/drawn-line'
import { LOW_ROAD_SURVEY, lowRoadContent, sizeRun } from '../../support/ferry-quay'

const VIEWS = [
  { width: 1100, height: 260 },
  { width: 360, height: 230 },
]
const say = textResolver({ ...texts.en, ...areaTexts.en }, 'metric')
const start = lowRoadContent({ place: 60, sizes: [sizeRun(0, 90), sizeRun(90, 180, 2)] })
const grounds = start.grounds.map((ground) => ({ ...ground, suitable: true }))
const content = { ...start, grounds }
const answer = checkLine({ stations: LOW_ROAD_STATIONS, sectionLength: 10 }, content)
const lowRoad: LongSectionInput = {
  ...drawnScenario(LOW_ROAD_SURVEY, content, answer),
  view: VIEWS[0]!,
  measure: measureWith(say),
}
const textsOf = (input: LongSectionInput) =>
  longSectionScene(input).items.flatMap((item) => (item.kind === 'text' ? [item] : []))
const idsOf = (input: LongSectionInput) => longSectionScene(input).items.map(({ id }) => id)

describe.each(VIEWS)('a long section at $width px', (view) => {
  const input = { ...lowRoad, view }
  const { frame } = longSectionScene(input)

  it('draws lengths to scale and heights larger by the factor that it states', () => {
    const perLength = (frame.toX(100) - frame.toX(0)) / 100
    const perHeight = frame.toY(3) - frame.toY(4)
    expect(perHeight / perLength).toBeCloseTo(frame.exaggeration, 9)
    const stated = textsOf(input).find(({ id }) => id === 'scale')
    expect(stated && say(stated.message)).toBe(`heights × ${frame.exaggeration}`)
  })

  it('keeps ground, water, crests and limits inside its frame', () => {
    for (const level of [2.79, 3.42, 3.56 + 1]) {
      expect(frame.toY(level)).toBeGreaterThanOrEqual(frame.top - 1e-9)
      expect(frame.toY(level)).toBeLessThanOrEqual(frame.bottom)
    }
    expect([frame.toX(0), frame.toX(180)]).toEqual([frame.left, frame.right])
  })

  it('lets no two texts meet', () => {
    const boxes = textsOf(input).map((item) =>
      textBox(item, measureWith(say)(item.message, item.size, item.weight), item.size),
    )
    boxes.forEach((box, i) =>
      boxes.slice(i + 1).forEach((other) => expect(boxesMeet(box, other)).toBe(false)),
    )
  })

  it('names the weakest place, its level rounded down, and the water', () => {
    const words = textsOf(input).map(({ message }) => say(message))
    const level = Math.floor(answer.weakest.holdsToLevel! * 1000) / 1000
    expect(words).toContain(`ch ${answer.weakest.place} holds to ${level.toFixed(3)}\u00a0m`)
    expect(words).toContain('water 3.420\u00a0m')
  })
})

it('counts its sections by verdict for those who do not see it', () => {
  const words = longSectionScene(lowRoad).description.map(say).join(' ')
  const count = (verdict: string) => answer.sections.filter((s) => s.verdict === verdict).length
  expect(words).toContain(`${count('holds')} hold, ${count('narrow')} hold narrowly`)
  expect(words).toContain(`${count('fails')} do not hold`)
  expect(words).toContain('The lowest ground is 2.790\u00a0m, at chainage 45.')
})

it('shows a survey alone without water, tubes and verdicts', () => {
  const survey = { ...drawnSurvey(LOW_ROAD_SURVEY), view: VIEWS[0]! }
  const ids = idsOf(survey)
  expect(ids).toContain('ground-line')
  expect(ids.filter((id) => /water|tube|holds|sections|place|weakest/.test(id))).toEqual([])
})

it('draws a line of one station as one section long', () => {
  const [station] = LOW_ROAD_STATIONS
  const { frame } = longSectionScene({
    ...drawnSurvey({ stations: [station!], sectionLength: 10 }),
    view: VIEWS[1]!,
  })
  expect([frame.from, frame.to]).toEqual([0, 10])
  expect(Number.isFinite(frame.exaggeration)).toBe(true)
})

it('marks the weakest place on the ground where nothing holds', () => {
  const weakest = { chainage: 142, holdsToLevel: null }
  const words = textsOf({ ...lowRoad, weakest }).map(({ message }) => say(message))
  expect(words).toContain('ch 142: nothing holds')
})

it('reads ground between stations, depth, tube and limit at any chainage', () => {
  const read = readLongSection(lowRoad, 42.5)
  expect(read.groundLevel).toBeCloseTo((3.03 + 2.79) / 2, 12)
  expect(read.depth).toBeCloseTo(3.42 - 2.91, 12)
  expect(read).toMatchObject({ surface: 'concrete', diameter: 0.7 })
  const section = answer.sections.find(({ from, to }) => from <= 42.5 && 42.5 <= to)
  expect(read.holdsToLevel).toBe(section!.holdsToLevel)
  expect(readLongSection(lowRoad, 175)).toMatchObject({ depth: 0, diameter: 1 })
})

it('is one valid SVG file in both themes', () => {
  for (const theme of ['light', 'dark'] as const) {
    const svg = sceneToSvg(longSectionScene(lowRoad), { resolve: say, theme })
    expect(svg).toMatch(/^<svg[\s\S]*<\/svg>\s*$/)
    expect(svg).not.toMatch(/NaN|Infinity|undefined/)
  }
})
