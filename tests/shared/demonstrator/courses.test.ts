import { describe, expect, it } from 'vitest'
import { evaluateSection } from '../../../shared/checks/evaluate-section'
import { TOPICS } from '../../../shared/demonstrator/course'
import { comparisonFor } from '../../../shared/demonstrator/everyday'
import { sceneFigures } from '../../../shared/demonstrator/figures'
import { DEMO_GROUNDS } from '../../../shared/demonstrator/grounds'
import { eased, scriptDuration, valuesAt } from '../../../shared/demonstrator/motion'
import { scenePicture } from '../../../shared/demonstrator/picture'
import { factsKey, sceneFacts } from '../../../shared/demonstrator/scene-facts'
import { sectionOf, withValues } from '../../../shared/demonstrator/setting'
import { STANDARD_COURSES } from '../../../shared/demonstrator/standard-courses'
import { STANDARD_SCENES } from '../../../shared/demonstrator/standard-scenes'
import { demoEvaluation } from '../../../shared/demonstrator/verdict'
import { sceneQuestion, sceneWords } from '../../../shared/demonstrator/words'
import { demonstrationScene } from '../../../shared/drawing/demonstration'
import { standingOutline } from '../../../shared/drawing/standing-outline'
import { measureWith } from '../../../shared/drawing/text-width'
import { sectionFaults } from '../../../shared/schemas/section-faults'
import { demonstratorAreaTexts } from '../../../shared/texts/demonstrator-area'
import { textResolver, type Message } from '../../../shared/texts/format-text'
import { playedScene } from '../../support/played-scene'

const SYSTEMS = ['metric', 'us'] as const
const SHARES = [0, 0.6, 1]
const scenes = STANDARD_SCENES.map((scene) => [scene.topic, scene] as const)

/** A message that became words: nothing left to fill in, no key, no figure that is not one. */
function expectSaid(message: Message): void {
  for (const system of SYSTEMS) {
    const words = textResolver(demonstratorAreaTexts.en, system)(message)
    expect(words).not.toMatch(/\{|demonstrator\.|NaN|undefined|Infinity/)
    expect(words).not.toBe('')
  }
}

describe('courses', () => {
  it('has eleven scenes in the full one and five in the short one', () => {
    const [short, full] = STANDARD_COURSES
    expect(full?.scenes.map(({ topic }) => topic)).toEqual([...TOPICS])
    expect(
      short?.scenes.map(({ id }) => STANDARD_SCENES.findIndex((one) => one.id === id) + 1),
    ).toEqual([2, 3, 4, 5, 11])
    expect([short?.duration, full?.duration]).toEqual([720, 1500])
  })

  it.each(scenes)('%s has words in every slot and answers the room', (_topic, scene) => {
    const { answer } = sceneFacts(scene, scene.start)
    const { min, max } = scene.guess
    expect(answer).not.toBeNull()
    expect(answer).toBeGreaterThanOrEqual(min)
    expect(answer).toBeLessThanOrEqual(max)
    for (const slot of ['title', 'see', 'notes'] as const) expectSaid(sceneWords(scene, slot))
    for (const system of SYSTEMS) expectSaid(sceneQuestion(scene, system))
  })

  it.each(scenes)('%s is a case of the engine all the way, and draws it', (_topic, scene) => {
    const facts = sceneFacts(scene, scene.start)
    for (const share of SHARES) {
      const setting = playedScene(scene, share, facts)
      const section = sectionOf(setting)
      expect(sectionFaults(section)).toEqual([])
      expect(
        factsKey(scene, withValues(setting, { skirtLength: scene.start.values.skirtLength })),
      ).toBe(factsKey(scene, scene.start))
      const { evaluation } = demoEvaluation(setting)
      const of = { scene, setting, evaluation, facts, guess: scene.guess.max / 2, isShown: true }
      const picture = demonstrationScene(
        {
          ...scenePicture(of),
          case: section,
          evaluation,
          outline: standingOutline(section),
          view: { width: 860, height: 330 },
          measure: measureWith(textResolver(demonstratorAreaTexts.en, 'metric')),
        },
        true,
      )
      expect(JSON.stringify(picture)).not.toMatch(/NaN|Infinity|null/)
      picture.items.forEach((item) => item.kind === 'text' && expectSaid(item.message))
      for (const system of SYSTEMS) {
        const { head, lines, exact, comparison } = sceneFigures(scene, setting, system)
        for (const message of [head, ...lines, exact, comparison]) if (message) expectSaid(message)
      }
    }
  })

  it('takes words of its own before the standard ones', () => {
    const scene = { ...STANDARD_SCENES[0]!, words: { title: 'Ours', question: 'How much?' } }
    const say = textResolver(demonstratorAreaTexts.en, 'metric')
    expect(say(sceneWords(scene, 'title'))).toBe('Ours')
    expect(say(sceneQuestion(scene, 'metric'))).toBe('How much?')
    expect(say(sceneWords(scene, 'notes'))).not.toBe('')
  })
})

describe('verdicts on the stage', () => {
  it.each(scenes)(
    '%s never says that it holds where the engine says it does not',
    (_topic, scene) => {
      const facts = sceneFacts(scene, scene.start)
      for (const share of SHARES) {
        for (const ground of DEMO_GROUNDS) {
          const setting = { ...playedScene(scene, share, facts), ground }
          const { verdict } = demoEvaluation(setting)
          if (evaluateSection(sectionOf(setting)).verdict === 'fails') expect(verdict).toBe('fails')
        }
      }
    },
  )

  it('says of mud, of a bare tube and of a gale on an empty one that they do not hold', () => {
    const { start } = STANDARD_SCENES[0]!
    const mud = DEMO_GROUNDS.find(({ id }) => id === 'bare-mud')!
    expect(demoEvaluation({ ...start, ground: mud }).verdict).toBe('fails')
    expect(demoEvaluation(withValues(start, { depth: 0, skirtLength: 0 })).verdict).toBe('fails')
    expect(demoEvaluation(withValues(start, { depth: 0, gust: 20 })).verdict).toBe('fails')
    expect(demoEvaluation(withValues(start, { depth: 0, gust: 0 })).verdict).toBe('holds')
  })
})

describe('the script', () => {
  it('begins and ends at rest, half way at half time', () => {
    expect([eased(-1), eased(0), eased(0.5), eased(1), eased(2)]).toEqual([0, 0, 0.5, 1, 1])
    expect(eased(0.01)).toBeLessThan(0.001)
    expect(1 - eased(0.99)).toBeLessThan(0.001)
  })

  it('plays one leg after another and ends exactly where they say', () => {
    const { start, legs } = STANDARD_SCENES.find(({ topic }) => topic === 'unroll')!
    const unrolled = valuesAt(start.values, legs, null, 3)
    expect([unrolled.skirtLength, unrolled.depth]).toEqual([2.2, 0])
    const end = valuesAt(start.values, legs, null, scriptDuration(legs))
    expect([end.skirtLength, end.depth]).toEqual([2.2, 0.42])
    expect(valuesAt(start.values, legs, null, 0)).toEqual(start.values)
  })
})

describe('comparisons', () => {
  it('takes the heaviest thing of which there is at least one', () => {
    expect(comparisonFor(151.25)).toMatchObject({ thing: { id: 'person' } })
    expect(comparisonFor(151.25)?.count).toBeCloseTo(151.25 / 75, 12)
    expect(comparisonFor(1200)?.thing.id).toBe('car')
    expect(comparisonFor(19)).toBeNull()
  })
})
