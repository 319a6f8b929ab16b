import type { Course, Topic } from './course'
import { STANDARD_SCENES } from './standard-scenes'

const MINUTE = 60

/** What fits into a quarter of an hour. */
const SHORT: readonly Topic[] = ['floats', 'unroll', 'grip', 'creep', 'leave']

/** The courses that everybody may show. */
export const STANDARD_COURSES: readonly Course[] = [
  {
    id: 'short',
    duration: 12 * MINUTE,
    scenes: STANDARD_SCENES.filter(({ topic }) => SHORT.includes(topic)),
  },
  { id: 'full', duration: 25 * MINUTE, scenes: STANDARD_SCENES },
]
