import type { SectionCase } from '@shared/schemas/section-case'
import type { CheckId, Verdict } from '@shared/schemas/section-result'
import type { ResolveText } from '@shared/texts/format-text'
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
}

/** Two lines for a message: the answer, and what it rests on with the link. */
export function caseAsText(
  say: ResolveText,
  given: (value: number, kind: QuantityKind) => string,
  text: TextOfCase,
): string {
  const { section, surface, verdict, governs, water, holdsTo, leave, link } = text
  const { barrier, ground, uplift, basis } = section
  const first = say({
    key: 'quickCheck.asText.first',
    values: {
      verdict: say({ key: `checks.verdict.${verdict}` }),
      governs: say({ key: `checks.name.${governs}` }),
      water,
      holdsTo,
      leave,
    },
  })
  const second = say({
    key: 'quickCheck.asText.second',
    values: {
      diameter: given(barrier.diameter, 'length'),
      skirt: given(barrier.skirtLength, 'length'),
      air: given(barrier.airPressure, 'pressure'),
      surface: say({ key: `checks.ground.${surface}` }),
      friction: given(ground.friction, 'ratio'),
      edge: given(uplift.edgeFactor, 'percent'),
      basis: say({ key: basisKey(basis) }),
      link,
    },
  })
  return `${first}\n${second}`
}
