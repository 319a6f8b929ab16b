import { gapFlow } from '../calc/ground/gap-flow'
import { waterDensity, waterViscosity } from '../calc/water/water-properties'
import { EDGE_FACTORS, type EdgeId } from '../checks/what-decides'
import { floatingDepth, gripLost, holdsToOf, lostDepth } from './answers'
import { evaluateAt } from './balance'
import { asHeavyAs, limit, perRun, quantity, said, type SceneFigures, type Shown } from './messages'
import { sectionOf, withValues, type DemoSetting } from './setting'

/** Mass per metre that weighs as much as a force per metre [kg/m]. */
function massOf(force: number, setting: DemoSetting): number {
  return force / sectionOf(setting).gravity
}

/** Scene 1: the push grows with the square of the depth. */
export function pushFigures({ setting, start, units }: Shown): SceneFigures {
  const [then, now] = [evaluateAt(start), evaluateAt(setting)]
  const { total } = now.thrust
  const mass = massOf(total, setting)
  const times = said('figure.push.times', {
    deeper: quantity(setting.values.depth / start.values.depth, 'ratio', 1),
    harder: quantity(total / then.thrust.total, 'ratio', 1),
  })
  return {
    head: perRun('figure.push', mass, units),
    lines: start.values.depth > 0 ? [times] : [],
    exact: said('figure.push.exact', {
      force: quantity(total, 'forcePerLength'),
      depth: quantity(setting.values.depth, 'length'),
    }),
    comparison: asHeavyAs(mass, units),
  }
}

/** Scene 2: without its skirt the tube floats up and rolls off. */
export function floatsFigures({ setting }: Shown): SceneFigures {
  const lost = lostDepth(setting)
  const floating = floatingDepth(setting)
  const at = lost ?? setting.values.depth
  const { vertical } = evaluateAt(setting, { depth: at })
  const depth = quantity(at, 'length')
  const mass = quantity(setting.tube.mass, 'massPerLength')
  const isBare = setting.values.skirtLength === 0 && floating !== null
  const skirted = said('figure.floats.skirted', { depth })
  return {
    head:
      lost === null
        ? said('figure.floats.none')
        : said('figure.floats.head', { depth: quantity(lost, 'smallLength') }),
    lines: isBare ? [said('figure.floats.lifts', { mass })] : lost === null ? [] : [skirted],
    exact: said('figure.floats.exact', {
      lift: quantity(vertical.lift + vertical.uplift, 'forcePerLength', 3),
      self: quantity(vertical.self, 'forcePerLength', 3),
      depth,
    }),
    comparison: null,
  }
}

/** Scene 3: what stands on the skirt, beside what pushes. */
export function unrollFigures({ setting, units }: Shown): SceneFigures {
  const { vertical, thrust, anchoringMassPerSection } = evaluateAt(setting)
  const mass = anchoringMassPerSection / setting.tube.sectionLength
  return {
    head: perRun('figure.unroll', mass, units),
    lines: [
      said('figure.unroll.push', {
        push: quantity(massOf(thrust.total, setting), 'massPerLength', 0),
        self: quantity(setting.tube.mass, 'massPerLength'),
      }),
    ],
    exact: said('figure.unroll.exact', {
      force: quantity(vertical.waterOnSkirt, 'forcePerLength'),
      thrust: quantity(thrust.total, 'forcePerLength'),
    }),
    comparison: asHeavyAs(mass, units),
  }
}

/** Scene 5: what water under the skirt takes away. */
export function creepFigures({ setting }: Shown): SceneFigures {
  const lost = gripLost(setting)
  const { vertical } = evaluateAt(setting)
  const to = (edge: EdgeId) =>
    limit(holdsToOf(withValues(setting, { edgeFactor: EDGE_FACTORS[edge] })).depth)
  const crease = creaseLine(setting)
  const edges = { open: to('open'), weighed: to('weighed'), sealed: to('sealed') }
  return {
    head:
      lost === null
        ? said('figure.creep.none')
        : said('figure.creep.head', { share: quantity(lost, 'percent') }),
    lines: [said('figure.creep.edges', edges), ...crease],
    exact: said('figure.creep.exact', {
      uplift: quantity(vertical.uplift, 'forcePerLength'),
      onSkirt: quantity(vertical.waterOnSkirt, 'forcePerLength'),
    }),
    comparison: null,
  }
}

/** Flow through the crease, and what twice its height would let through. */
function creaseLine(setting: DemoSetting): SceneFigures['lines'] {
  const { crease, depth, dryDepth, skirtLength } = setting.values
  if (crease <= 0 || skirtLength <= 0 || depth <= dryDepth) return []
  const through = (width: number) =>
    gapFlow({
      width,
      head: depth - dryDepth,
      path: skirtLength,
      viscosity: waterViscosity(WATER_TEMPERATURE) / waterDensity(WATER_TEMPERATURE),
      gravity: sectionOf(setting).gravity,
    }).perMetre
  const flow = through(crease)
  return [
    said('figure.creep.crease', {
      crease: quantity(crease, 'smallLength', 1),
      flow: quantity(flow, 'flow', 1),
      more: quantity(through(2 * crease) / flow, 'ratio', 1),
    }),
  ]
}

/** Flood water is cold [°C]. */
const WATER_TEMPERATURE = 10
