import type { Message } from '../texts/format-text'
import type { UnitSystem } from '../units'
import { holdsToOf } from './answers'
import { balanceAt } from './balance'
import type { CourseScene, Leg, WordSlot } from './course'
import { groundOf } from './grounds'
import { limit, massOnRun, quantity, said } from './messages'
import { scriptDuration, valuesAt } from './motion'
import { sectionOf, type DemoSetting } from './setting'

/** Words of a scene: its own, else the standard ones. */
export function sceneWords(scene: CourseScene, slot: Exclude<WordSlot, 'question'>): Message {
  const own = scene.words?.[slot]
  return own === undefined ? said(`scene.${scene.topic}.${slot}`) : said('verbatim', { text: own })
}

/** What the room is asked, with the figures of the start. */
export function sceneQuestion(scene: CourseScene, units: UnitSystem): Message {
  const own = scene.words?.question
  if (own !== undefined) return said('verbatim', { text: own })
  return said(`scene.${scene.topic}.question`, askedWith(scene, units))
}

type Values = NonNullable<Message['values']>

function askedWith({ topic, start, legs }: CourseScene, units: UnitSystem): Values {
  switch (topic) {
    case 'push': {
      const mass = balanceAt(start).push / sectionOf(start).gravity
      return { push: massOnRun(mass, units) }
    }
    case 'unroll':
      return { depth: quantity(endDepth(start, legs), 'length', 2) }
    case 'grounds':
      return { turf: limit(holdsToOf({ ...start, ground: groundOf('turf') }).depth) }
    case 'leave':
      return { rise: quantity(start.values.rateOfRise * 3600, 'length', 2) }
    default:
      return {}
  }
}

/** Depth to which the script goes; a leg to the answer is left out. */
function endDepth(start: DemoSetting, legs: readonly Leg[]): number {
  return valuesAt(start.values, legs, null, scriptDuration(legs)).depth
}
