import { evaluateSection } from '../checks/evaluate-section'
import { EDGE_FACTORS } from '../checks/what-decides'
import { crossSectionScene } from '../drawing/cross-section'
import { factorChartScene, type FactorSeries } from '../drawing/factor-chart'
import { pressureDiagramScene } from '../drawing/pressure-diagrams'
import { lastStanding, standingOutline } from '../drawing/standing-outline'
import { measureWith } from '../drawing/text-width'
import type { SectionCase } from '../schemas/section-case'
import type { Sheet } from '../schemas/sheet'
import type { Message } from '../texts/format-text'
import { leaveOf } from './cover'
import type { Drawing } from './document'
import type { SheetWords } from './sheet-words'

/** Width of the drawings [px]: that of the text, so that their texts come out near 8 pt. */
const WIDTH = 640

/** The barrier in its loaded shape. */
export function sectionDrawing(sheet: Sheet, words: SheetWords): Drawing {
  const { case: section, result, groundLevel, datum } = sheet
  const outline = standingOutline(section)
  const { from, depth } = result.holdsTo
  const scene = crossSectionScene({
    case: section,
    evaluation: result,
    outline,
    lastStanding: outline ? null : lastStanding(section),
    marks: { holdsTo: from === null ? null : depth, leave: leaveOf(sheet).depth },
    level: groundLevel === null ? null : { ground: groundLevel, datum },
    view: { width: WIDTH, height: 246 },
    measure: measureWith(words.resolve),
  })
  return { scene, caption: words.say('sheet.caption.section') }
}

/** Pressures on the face, on the skirt and from below. */
export function pressureDrawing({ case: section, result }: Sheet, words: SheetWords): Drawing {
  const view = { width: WIDTH, height: 210 }
  return {
    scene: pressureDiagramScene({ section, result, view }),
    caption: words.say('sheet.caption.pressures'),
  }
}

/** Sliding factor against depth, with the edge as it is and sealed, or open if it is sealed. */
export function factorDrawing(sheet: Sheet, words: SheetWords): Drawing {
  const { case: section, result } = sheet
  const { from, depth } = result.holdsTo
  const scene = factorChartScene({
    view: { width: WIDTH, height: 250 },
    series: factorSeries(section, sheet.gripShare),
    required: result.sliding.required,
    greatestDepth: section.barrier.diameter,
    now: section.water.depth,
    holdsTo: from === null ? null : depth,
    measure: measureWith(words.resolve),
  })
  return { scene, caption: words.say('sheet.caption.factors') }
}

const POINTS = 48

function factorSeries(section: SectionCase, gripShare: number): readonly FactorSeries[] {
  const { model, edgeFactor } = section.uplift
  const chosen: FactorSeries = {
    id: 'chosen',
    label: model === 'none' ? edgeLabel('none') : edgeLabel(edgeFactor),
    style: 'chosen',
    points: pointsOf(section, gripShare),
  }
  if (model === 'none') return [chosen]
  const other = edgeFactor === EDGE_FACTORS.sealed ? EDGE_FACTORS.open : EDGE_FACTORS.sealed
  const changed = { ...section, uplift: { ...section.uplift, edgeFactor: other } }
  const points = pointsOf(changed, gripShare)
  return [chosen, { id: 'other-edge', label: edgeLabel(other), style: 'alternative', points }]
}

function pointsOf(section: SectionCase, gripShare: number): FactorSeries['points'] {
  return Array.from({ length: POINTS }, (_, index) => {
    const depth = (section.barrier.diameter * (index + 1)) / POINTS
    const at = { ...section, water: { ...section.water, depth } }
    return { depth, factor: evaluateSection(at, gripShare).sliding.factor }
  })
}

function edgeLabel(edge: number | 'none'): Message {
  if (edge === 'none') return { key: 'sheet.series.none' }
  const named = Object.entries(EDGE_FACTORS).find(([, factor]) => factor === edge)
  if (named) return { key: `sheet.series.${named[0]}` }
  return { key: 'sheet.series.typed', values: { share: { value: edge, kind: 'percent' } } }
}
