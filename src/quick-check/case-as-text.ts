import type { SectionCase } from '@shared/schemas/section-case'
import type { CheckId, Verdict } from '@shared/schemas/section-result'
import type { Message, ResolveText } from '@shared/texts/format-text'
import type { QuantityKind } from '@shared/units'
import { basisKey } from './basis-key'

/** What goes into a message. */
export interface TextOfCase {
  readonly verdict: Verdict
  readonly governs: CheckId
  readonly water: string
  readonly holdsTo: string
  readonly leave: string
  readonly section: SectionCase
  readonly surface: string
  readonly link: string
  /** What the coldest and the hottest hour make of it. */
  readonly hours: readonly Message[]
  /** The figures belong to an older input: something typed since is refused. */
  readonly isStale: boolean
}

/** Shows a figure as it was given. */
type Given = (value: number, kind: QuantityKind) => string

/** What the answer is made of. */
type Answer = Pick<TextOfCase, 'verdict' | 'governs' | 'water' | 'holdsTo' | 'leave'>

/** The answer in one line: verdict, water, holds-to and leave level, what governs. */
export function answerLine(
  say: ResolveText,
  { verdict, governs, water, holdsTo, leave }: Answer,
): string {
  return say({
    key: 'quickCheck.asText.first',
    values: {
      verdict: say({ key: `checks.verdict.${verdict}` }),
      governs: say({ key: `checks.name.${governs}` }),
      water,
      holdsTo,
      leave,
    },
  })
}

/** Two lines for a message: the answer, and what it rests on with the link. */
export function caseAsText(say: ResolveText, given: Given, text: TextOfCase): string {
  const { section, surface, link } = text
  const { barrier, ground, uplift, basis } = section
  const second = say({
    key: 'quickCheck.asText.second',
    values: {
      diameter: given(barrier.diameter, 'length'),
      skirt: given(barrier.skirtLength, 'length'),
      air: given(barrier.airPressure, 'pressure'),
      surface: say({ key: `checks.ground.${surface}` }),
      friction: given(ground.friction, 'ratio'),
      edge: say(edgeMessage(uplift, given)),
      loads: loadMessages(section, given)
        .map((message) => `, ${say(message)}`)
        .join(''),
      basis: say({ key: basisKey(basis) }),
      link,
    },
  })
  const stale = text.isStale ? `${say({ key: 'quickCheck.asText.stale' })} ` : ''
  const hours = text.hours.map((hour) => ` ${say(hour)}`).join('')
  return `${stale}${answerLine(say, text)}${hours}\n${second}`
}

/** The skirt edge as the text says it. */
export function edgeMessage(uplift: SectionCase['uplift'], given: Given): Message {
  if (uplift.model === 'none') return { key: 'quickCheck.asText.edge.none' }
  const values = { edge: given(uplift.edgeFactor, 'percent') }
  return { key: 'quickCheck.asText.edge.open', values }
}

/** Everything that is not as in plain still water on level ground. */
export function loadMessages(section: SectionCase, given: Given): readonly Message[] {
  const { water, debris, ground, requiredFreeboard } = section
  const load = (id: string, value = ''): Message => ({
    key: `quickCheck.asText.load.${id}`,
    values: { value },
  })
  return [
    ...(water.dryDepth > 0 ? [load('dryDepth', given(water.dryDepth, 'length'))] : []),
    ...(water.currentSpeed > 0 ? [load('current', given(water.currentSpeed, 'speed'))] : []),
    ...(water.waveHeight > 0 ? [load('waves', given(water.waveHeight, 'length'))] : []),
    ...(debris.force > 0 ? [load('debris')] : []),
    ...(ground.fall !== 0 ? [load('fall', given(ground.fall, 'percent'))] : []),
    load('freeboard', given(requiredFreeboard, 'length')),
  ]
}
