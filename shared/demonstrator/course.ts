import type { QuantityKind } from '../units'
import type { DemoSetting, DemoValue } from './setting'

/** What a scene is about: it decides picture, figures and what the room is asked. */
export const TOPICS = [
  'push',
  'floats',
  'unroll',
  'grip',
  'creep',
  'grounds',
  'night',
  'puncture',
  'wind',
  'pond',
  'leave',
] as const
export type Topic = (typeof TOPICS)[number]

/** Where the guess of the room is marked. */
export type GuessPlace = 'level' | 'dryLevel' | 'bar' | 'chart'

/** What the room guesses, SI units; masses are those on one metre of barrier. */
export interface Guess {
  readonly kind: QuantityKind
  readonly place: GuessPlace
  readonly min: number
  readonly max: number
  readonly step: number
  /** Digits after the decimal point, where the usual ones say too much. */
  readonly decimals?: number
}

/** One movement of the script: a figure goes calmly to another, or to the answer of the scene. */
export interface Leg {
  readonly value: DemoValue
  readonly to: number | 'answer'
  readonly seconds: number
}

/** Slots of words in a scene that a composed course may fill by itself. */
export const WORD_SLOTS = ['title', 'question', 'see', 'notes'] as const
export type WordSlot = (typeof WORD_SLOTS)[number]

/** One scene of a course: data, nothing else. */
export interface CourseScene {
  /** Unique in its course. */
  readonly id: string
  readonly topic: Topic
  readonly start: DemoSetting
  readonly legs: readonly Leg[]
  readonly guess: Guess
  /** Words of its own instead of the standard ones. */
  readonly words?: Partial<Record<WordSlot, string>>
}

/** An ordered course. */
export interface Course {
  readonly id: string
  /** Its length as planned [s]. */
  readonly duration: number
  readonly scenes: readonly CourseScene[]
}
