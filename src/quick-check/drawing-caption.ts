import type { CaptionParagraph } from '@shared/drawing/captioned-scene'
import type { TextRole } from '@shared/drawing/scene'
import type { SectionCase } from '@shared/schemas/section-case'
import type { Verdict } from '@shared/schemas/section-result'
import { texts } from '@shared/texts'
import { textResolver, type Message, type ResolveText } from '@shared/texts/format-text'
import { sectionDetails } from '@shared/texts/section-details.en'
import type { QuantityKind, UnitSystem } from '@shared/units'
import { version } from '../../package.json'
import { basisKey } from './basis-key'
import { edgeMessage, loadMessages } from './case-as-text'
import { givenText } from './field-text'

/** What a picture says under its drawing, so that it can leave its page. */
export interface PictureOf {
  readonly section: SectionCase
  readonly surface: string
  readonly verdict: Verdict
  /** The answer in one sentence: water, holds-to and leave level, what governs. */
  readonly answer: string
  /** Some water can be relied on. */
  readonly holds: boolean
  /** Name of the datum; empty where it is not known. */
  readonly datum: string
  /** What the coldest and the hottest hour make of it. */
  readonly hours: readonly Message[]
  readonly isStale: boolean
  readonly link: string
}

const TONES: Readonly<Record<Verdict, TextRole>> = {
  holds: 'labelHolds',
  narrow: 'labelNarrow',
  fails: 'labelFails',
  notChecked: 'labelQuiet',
}

const CAUTIONS = ['guarantee', 'codes', 'leave', 'people', 'ground', 'power'] as const

/** The caption, most important first. It names what the figures rest on, and the cautions. */
export function drawingCaption(
  picture: PictureOf,
  units: UnitSystem,
  now: Date,
): readonly CaptionParagraph[] {
  const say = resolver(units)
  const key = (name: string) => `sectionDetails.caption.${name}`
  const line = (role: TextRole, text: string, size = 13): CaptionParagraph => ({
    text,
    role,
    size,
    weight: 400,
  })
  const { answer, verdict, hours, isStale, datum, link, holds } = picture
  const stale = isStale ? `${say({ key: 'quickCheck.asText.stale' })} ` : ''
  const level = datum === '' ? '' : ` ${say({ key: key('datum'), values: { datum } })}`
  const values = restsOn(picture, units)
  return [
    { ...line(TONES[verdict], `${stale}${answer}${level}`, 16), weight: 600 },
    ...hours.map((hour) => line('labelNarrow', say(hour))),
    line('label', say({ key: key('restsOn'), values })),
    // Without a skirt there is nothing on which an answer could stand.
    ...(picture.section.barrier.skirtLength === 0
      ? []
      : [line('label', say({ key: key(holds ? 'holdsOnlyIf' : 'standsOnlyIf'), values }))]),
    line('label', CAUTIONS.map((caution) => say({ key: `shell.cautions.${caution}` })).join(' ')),
    line('labelQuiet', say({ key: key('made'), values: { version, date: dateOf(now) } }), 12),
    line('labelQuiet', link, 11),
  ]
}

type Given = (value: number, kind: QuantityKind) => string

function resolver(units: UnitSystem): ResolveText {
  return textResolver({ ...texts.en, ...sectionDetails.en }, units)
}

function dryWords(depth: number, given: Given): Message {
  if (depth === 0) return { key: 'sectionDetails.caption.dryNone' }
  return { key: 'sectionDetails.caption.drySome', values: { depth: given(depth, 'length') } }
}

function dateOf(now: Date): string {
  return new Intl.DateTimeFormat('en-GB', { dateStyle: 'long', timeStyle: 'short' }).format(now)
}

function restsOn({ section, surface }: PictureOf, units: UnitSystem) {
  const say = resolver(units)
  const given: Given = (value, kind) => givenText(value, kind, units)
  const { barrier, ground, uplift, water, basis } = section
  return {
    diameter: given(barrier.diameter, 'length'),
    skirt: given(barrier.skirtLength, 'length'),
    mass: given(barrier.mass, 'massPerLength'),
    air: given(barrier.airPressure, 'pressure'),
    length: given(barrier.sectionLength, 'length'),
    surface: say({ key: `checks.ground.${surface}` }),
    friction: given(ground.friction, 'ratio'),
    edge: say(edgeMessage(uplift, given)),
    dry: say(dryWords(water.dryDepth, given)),
    basis: say({ key: basisKey(basis) }),
    loads: loadMessages(section, given)
      .map((message) => `, ${say(message)}`)
      .join(''),
  }
}
