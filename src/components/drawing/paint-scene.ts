import { roleClass } from '@shared/drawing/paints-css'
import { coordinate, shapePath } from '@shared/drawing/path-data'
import type { Scene, SceneItem, ShapeRole, TextItem } from '@shared/drawing/scene'
import type { ResolveText } from '@shared/texts/format-text'

const SVG = 'http://www.w3.org/2000/svg'

/** What painting needs besides the scene. */
export interface Paints {
  /** The words of a text. */
  readonly say: ResolveText
  /** The gradient that fills an area of this role, if one does. */
  readonly fillOf: (role: ShapeRole) => string | undefined
}

/** An item on the canvas and what was last written on it. */
interface Painted {
  readonly element: SVGElement
  readonly written: Map<string, string | number>
}

/**
 * Paints scenes into one SVG, below what already stands there. Each scene is compared with the one
 * before and only what differs is written: under a drag that takes half the time of rendering the
 * same hundred elements as a template.
 */
export function scenePainter(canvas: SVGElement): (scene: Scene, paints: Paints) => void {
  const fixed = canvas.childElementCount
  let painted = new Map<string, Painted>()

  return ({ items }, paints) => {
    const next = new Map<string, Painted>()
    const texts = items.filter((item) => item.kind === 'text')
    const shapes = items.filter((item) => item.kind !== 'text')
    // Words stand above every shape.
    for (const item of [...shapes, ...texts]) {
      const key = `${item.kind === 'text' ? 'text' : 'path'} ${item.id}`
      const was = painted.get(key) ?? blank(item)
      write(was, item, paints)
      next.set(key, was)
    }
    for (const [key, { element }] of painted) if (!next.has(key)) element.remove()
    arrange(canvas, fixed, next.values())
    painted = next
  }
}

function blank({ kind }: SceneItem): Painted {
  const name = kind === 'text' ? 'text' : 'path'
  return { element: document.createElementNS(SVG, name), written: new Map() }
}

/** Puts the elements into their order; while it does not change, this only looks. */
function arrange(canvas: SVGElement, fixed: number, painted: Iterable<Painted>): void {
  let place = canvas.children[fixed] ?? null
  for (const { element } of painted) {
    if (element === place) place = place.nextElementSibling
    else canvas.insertBefore(element, place)
  }
}

function write(on: Painted, item: SceneItem, paints: Paints): void {
  if (item.kind === 'text') writeText(on, item, paints.say)
  else {
    set(on, 'class', roleClass(item.role))
    set(on, 'd', shapePath(item))
    set(on, 'fill', paints.fillOf(item.role))
  }
}

function writeText(on: Painted, item: TextItem, say: ResolveText): void {
  const name = roleClass(item.role)
  set(on, 'class', item.hasHalo ? `${name} scene-halo` : name)
  set(on, 'x', coordinate(item.x))
  set(on, 'y', coordinate(item.y))
  set(on, 'text-anchor', item.anchor)
  set(on, 'font-size', item.size)
  set(on, 'font-weight', item.weight)
  const words = say(item.message)
  if (on.written.get('words') === words) return
  on.written.set('words', words)
  on.element.textContent = words
}

function set(
  { element, written }: Painted,
  name: string,
  value: string | number | undefined,
): void {
  if (written.get(name) === value) return
  if (value === undefined) {
    written.delete(name)
    element.removeAttribute(name)
  } else {
    written.set(name, value)
    element.setAttribute(name, String(value))
  }
}
