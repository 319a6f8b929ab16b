import { checkBasis } from '../catalogue/check-bases'
import { crossingDepth, holdsToOf, leaveOf } from './answers'
import { pondLimit } from '../checks/pond-limit'
import { balanceAt, evaluateAt } from './balance'
import { limit, quantity, said, type SceneFigures, type Shown } from './messages'
import { sectionOf, type DemoSetting } from './setting'
import { groundOf, WET_GRASS } from './grounds'

/** Scene 4: where the push becomes as great as the grip. */
export function gripFigures({ setting }: Shown): SceneFigures {
  const crossing = crossingDepth(setting)
  const { push, grip } = balanceAt(setting)
  return {
    head:
      crossing === null
        ? said('figure.grip.none')
        : said('figure.grip.head', { depth: quantity(crossing, 'length') }),
    lines: [stopLine(setting)],
    exact: said('figure.grip.exact', {
      push: quantity(push, 'forcePerLength'),
      grip: quantity(grip, 'forcePerLength'),
      depth: quantity(setting.values.depth, 'length'),
    }),
    comparison: null,
  }
}

function stopLine(setting: DemoSetting): SceneFigures['head'] {
  const { depth, check } = holdsToOf(setting)
  if (depth <= 0) return said('figure.grip.stopNowhere')
  const holdsTo = limit(depth)
  if (check !== 'sliding' && check !== 'skirt') return said('figure.grip.stopOther', { holdsTo })
  const required = quantity(checkBasis(sectionOf(setting).basis).sliding, 'ratio', 1)
  return said('figure.grip.stop', { holdsTo, required })
}

/** Scene 6: what the barrier lies on. */
export function groundsFigures({ setting }: Shown): SceneFigures {
  const { depth } = holdsToOf(setting)
  const to = (ground: DemoSetting['ground']) => limit(holdsToOf({ ...setting, ground }).depth)
  const others = said('figure.grounds.others', {
    turf: to(groundOf('turf')),
    asphalt: to(groundOf('asphalt')),
    wet: to(WET_GRASS),
  })
  return {
    head:
      depth > 0
        ? said('figure.grounds.head', { depth: limit(depth) })
        : said('figure.grounds.nowhere'),
    lines: [others, said('figure.grounds.mud')],
    exact: said('figure.grounds.exact', { friction: quantity(setting.ground.friction, 'ratio') }),
    comparison: null,
  }
}

/** Scene 10: how water on the dry side takes the grip away. */
export function pondFigures({ setting }: Shown): SceneFigures {
  const found = pondLimit(sectionOf(setting))
  const dry = balanceAt(setting, { dryDepth: 0 })
  const now = balanceAt(setting)
  const share = dry.grip > 0 ? 1 - now.grip / dry.grip : 0
  const perMetre = evaluateAt(setting).seepage?.perMetre ?? null
  const grip = said('figure.pond.grip', { share: quantity(share, 'percent') })
  const seeps =
    perMetre === null
      ? []
      : [said('figure.pond.seeps', { flow: quantity(perMetre, 'flowPerLength') })]
  return {
    head: pondHead(found),
    lines: [grip, ...seeps],
    exact: said('figure.pond.exact', {
      grip: quantity(now.grip, 'forcePerLength'),
      dry: quantity(dry.grip, 'forcePerLength'),
      push: quantity(now.push, 'forcePerLength'),
    }),
    comparison: null,
  }
}

function pondHead(found: ReturnType<typeof pondLimit>): SceneFigures['head'] {
  if (found === null) return said('figure.pond.never')
  if (found.dryDepth === null) return said('figure.pond.none')
  const depth = { value: found.dryDepth, kind: 'smallLength', rounding: 'down' } as const
  return said('figure.pond.head', { depth })
}

/** Scene 11: the level at which everybody leaves. */
export function leaveFigures({ setting }: Shown): SceneFigures {
  const { depth } = holdsToOf(setting)
  const leave = leaveOf(setting)
  const { rateOfRise, clearingTime } = setting.values
  const holdsTo = limit(depth)
  const at = leave.depth === null ? null : limit(leave.depth)
  return {
    head: at ? said('figure.leave.head', { depth: at }) : said('figure.leave.none'),
    lines: [
      said('figure.leave.why', {
        holdsTo,
        rise: quantity(rateOfRise * HOUR, 'length', 2),
        clear: quantity(clearingTime, 'minutes'),
      }),
      said('figure.leave.margin', { margin: quantity(leave.margin, 'length', 2) }),
    ],
    exact: said('figure.leave.exact', { holdsTo, depth: limit(setting.values.depth) }),
    comparison: null,
  }
}

const HOUR = 3600
