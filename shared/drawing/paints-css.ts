import { HALO, SHAPE_PAINTS, TEXT_TONES, type Paint } from './paints'
import { SHAPE_ROLES, TEXT_ROLES, type ShapeRole, type TextRole } from './scene'

/** Class of a role on a page: `waterLine` is `scene-water-line`. */
export function roleClass(role: ShapeRole | TextRole): string {
  return CLASSES[role]
}

const CLASSES = Object.fromEntries(
  [...SHAPE_ROLES, ...TEXT_ROLES].map((role) => [
    role,
    `scene-${role.replace(/[A-Z]/g, (letter) => `-${letter.toLowerCase()}`)}`,
  ]),
) as Readonly<Record<ShapeRole | TextRole, string>>

function declarations({ fill, fade, fillOpacity, stroke, ...line }: Paint): readonly string[] {
  const rules: [string, string | number | undefined][] = [
    ['fill', fade ? undefined : fill ? `var(--${fill})` : 'none'],
    ['fill-opacity', fillOpacity],
    ['stroke', stroke && `var(--${stroke})`],
    ['stroke-width', line.width],
    ['stroke-opacity', line.strokeOpacity],
    ['stroke-dasharray', line.dash],
    ['stroke-linecap', line.cap],
    ['stroke-linejoin', stroke && 'round'],
  ]
  return rules.flatMap(([name, value]) => (value === undefined ? [] : [`${name}: ${value}`]))
}

function rule(selector: string, lines: readonly string[]): string {
  return lines.length === 0 ? '' : `${selector} {\n${lines.map((l) => `  ${l};\n`).join('')}}\n`
}

/** The looks of all roles as style rules, with the colours as variables of the page. */
export function paintsCss(): string {
  const shapes = SHAPE_ROLES.flatMap((role) => {
    const { fade } = SHAPE_PAINTS[role]
    const ends = fade
      ? fade.map((tone, index) =>
          rule(`.${roleClass(role)}-${index}`, [`stop-color: var(--${tone})`]),
        )
      : []
    return [rule(`.${roleClass(role)}`, declarations(SHAPE_PAINTS[role])), ...ends]
  })
  const texts = TEXT_ROLES.map((role) =>
    rule(`.${roleClass(role)}`, [`fill: var(--${TEXT_TONES[role]})`]),
  )
  const halo = rule('.scene-halo', [
    'paint-order: stroke',
    'stroke: var(--surface)',
    `stroke-width: ${HALO.width}`,
    `stroke-opacity: ${HALO.opacity}`,
    'stroke-linejoin: round',
  ])
  return [...shapes, ...texts, halo].filter((text) => text !== '').join('\n')
}
