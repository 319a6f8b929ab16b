import { sectionGeometry } from '../calc/section/section-geometry'
import { baseItems } from './pressure-diagrams/base-diagram'
import type { PressureDiagramInput } from './pressure-diagrams/diagram-items'
import { faceItems, facePressures } from './pressure-diagrams/face-diagram'
import type { Scene } from './scene'

export type { PressureDiagramInput } from './pressure-diagrams/diagram-items'

/**
 * Two diagrams side by side: what presses on the face against height, and what presses on the skirt
 * and from below against the place on the base. The water is on the left.
 */
export function pressureDiagramScene(input: PressureDiagramInput): Scene {
  const { section, result, view } = input
  const face = facePressures(input)
  const { depth, unitWeight } = sectionGeometry(section)
  const greatest = Math.max(unitWeight * depth, ...face.map(({ pressure }) => pressure), 1)
  const perMetre = (value: number) => ({ value, kind: 'forcePerLength' }) as const
  const values = {
    thrust: perMetre(result.thrust.total),
    pressure: { value: face[0]?.pressure ?? 0, kind: 'pressure' } as const,
    down: perMetre(result.vertical.waterOnSkirt),
    up: perMetre(result.vertical.uplift),
  }
  return {
    width: view.width,
    height: view.height,
    title: { key: 'sheet.diagram.title' },
    description: [{ key: 'sheet.diagram.describe', values }],
    items: [...faceItems(input, face, greatest), ...baseItems(input, greatest)],
  }
}
