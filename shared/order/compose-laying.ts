import { skirtPicture } from '../drawing/skirt-picture'
import type { OrderSection } from '../schemas/order'
import type {
  AirBlock,
  LayBlock,
  LayColumn,
  LoadBlock,
  LayRow,
  OrderDocument,
  OrderWork,
  PlugBlock,
} from './order-document'

const DEGREE = Math.PI / 180

/** What is put on the lorry. */
export function loadOf({ order, words }: OrderWork): LoadBlock {
  const { say } = words
  const { store, air, plugs } = order
  const row = (key: string, count: number | null) =>
    count === null || count === 0 ? [] : [{ label: say(key), value: String(count) }]
  const { ballastBags: wanted, ballastInStore: inStore } = store
  const isShort = wanted !== null && inStore !== null && wanted > inStore
  const ballast = isShort
    ? [
        {
          label: say('deploymentOrder.load.ballastBags'),
          value: say('deploymentOrder.load.short', { count: wanted, inStore }),
        },
      ]
    : row('deploymentOrder.load.ballastBags', wanted)
  const pipes = plugs.filter(({ diameter }) => diameter !== null)
  return {
    title: say('deploymentOrder.load.title'),
    depot: store.depot === null ? '' : say('deploymentOrder.load.depot', { depot: store.depot }),
    rows: [
      ...air.map(({ tube, pieces }) => ({ label: tube, value: String(pieces) })),
      ...row('deploymentOrder.load.closures', store.closures),
      ...row('deploymentOrder.load.edgeBags', store.edgeBags),
      ...ballast,
      ...row('deploymentOrder.load.plugs', pipes.length),
      ...row('deploymentOrder.load.blowers', store.blowers),
      ...row('deploymentOrder.load.crews', store.pairs),
    ],
    also: say('deploymentOrder.load.always'),
  }
}

/** What is plugged before anything is laid. */
export function plugsOf({ order, words }: OrderWork): PlugBlock {
  const { say, chainage, diameter, height, size } = words
  const rows = order.plugs.map((plug, i) => {
    const values = {
      chainage: chainage(plug.chainage),
      diameter: plug.diameter === null ? '' : diameter(plug.diameter),
      height: height(plug.shortBy),
    }
    const key = plug.isEnd ? (plug.shortBy > 0 ? 'end' : 'open') : plug.kind
    const text = say(`deploymentOrder.plug.${key}`, values)
    const { offset } = plug
    const side = offset === null || offset === 0 ? '' : offset > 0 ? 'dry' : 'wet'
    const where =
      side === ''
        ? ''
        : say(`deploymentOrder.plug.${side}`, { distance: size(Math.abs(offset ?? 0)) })
    const waits = plug.flows ? '' : say('deploymentOrder.plug.waits')
    return {
      id: `plug-${i + 1}`,
      text,
      more: [where, plug.note, waits].filter((part) => part !== '').join('. '),
      label: say('deploymentOrder.tick.mark', { what: text }),
    }
  })
  return {
    title: say('deploymentOrder.plug.title'),
    lead: say('deploymentOrder.plug.lead'),
    none: say('deploymentOrder.plug.none'),
    rows,
  }
}

/** The picture that says which side the water is on. */
export function skirtOf({ words }: OrderWork): OrderDocument['skirt'] {
  return {
    title: words.say('deploymentOrder.skirt.title'),
    text: words.say('deploymentOrder.skirt.text'),
    scene: skirtPicture(),
  }
}

/** The sections in the order in which they are laid. */
export function layOf(work: OrderWork): LayBlock {
  const { order, words } = work
  const { say, chainage } = words
  const column = (name: LayColumn) => say(`deploymentOrder.lay.column.${name}`)
  return {
    title: say('deploymentOrder.lay.title'),
    lead: say('deploymentOrder.lay.lead'),
    columns: {
      ...{ position: column('position'), place: column('place'), tube: column('tube') },
      ...{ pair: column('pair'), times: column('times'), water: column('water') },
      ...{ edgeBags: column('edgeBags'), ballast: column('ballast'), bend: column('bend') },
    },
    rows: order.sections.map((section) => layRow(work, section)),
    unlaid: order.unlaid.map(({ from, to }) =>
      say('deploymentOrder.answer.unlaid', { from: chainage(from), to: chainage(to) }),
    ),
  }
}

const some = (count: number | null): string => (count === null || count === 0 ? '' : String(count))

function layRow(work: OrderWork, section: OrderSection): LayRow {
  const { say, chainage, time } = work.words
  const { position, from, to, tube, pair, start, finish, deadline, margin, verdict } = section
  const times = start === null || finish === null ? '' : span(time(start), time(finish))
  const water = deadline === null ? '' : time(deadline)
  return {
    id: `section-${position}`,
    position,
    place: say('deploymentOrder.lay.place', { from: chainage(from), to: chainage(to) }),
    tube,
    pair: some(pair),
    edgeBags: some(section.edgeBags),
    ballast: ballastOf(work, section),
    bend: bendOf(work, section),
    ...{ times, water },
    hours: [
      pair === null ? '' : say('deploymentOrder.lay.pair', { pair }),
      times,
      water === '' ? '' : say('deploymentOrder.lay.water', { time: water }),
    ]
      .filter((part) => part !== '')
      .join(' · '),
    extras: extrasOf(work, section),
    isLate: margin !== null && margin < 0,
    fails: verdict === 'fails' ? say('deploymentOrder.lay.fails') : '',
    label: say('deploymentOrder.lay.done', { position }),
  }
}

/** Bags, or their mass where no bag in store says what it weighs. */
function ballastOf({ words }: OrderWork, { ballast, ballastBags }: OrderSection): string {
  if (ballastBags !== null) return some(ballastBags)
  return ballast === null || ballast === 0 ? '' : words.mass(ballast)
}

function bendOf({ words }: OrderWork, { turn }: OrderSection): string {
  const degrees = Math.round(Math.abs(turn) / DEGREE)
  if (degrees === 0) return ''
  const side = words.say(turn > 0 ? 'deploymentOrder.lay.left' : 'deploymentOrder.lay.right')
  return words.say('deploymentOrder.lay.bend', { degrees, side })
}

/** From one time to another; the day stands once where it is the same. */
function span(from: string, to: string): string {
  const [day = '', ...rest] = to.split(' ')
  return from.startsWith(`${day} `) ? `${from}–${rest.join(' ')}` : `${from}–${to}`
}

function extrasOf(work: OrderWork, section: OrderSection): readonly string[] {
  const { say, mass } = work.words
  const { edgeBags, ballast, ballastBags, margin } = section
  const bend = bendOf(work, section)
  const minutes = margin === null ? 0 : Math.ceil(-margin / 60)
  return [
    ...(bend === '' ? [] : [say('deploymentOrder.lay.bends', { bend })]),
    ...(edgeBags > 0 ? [say('deploymentOrder.lay.edge', { count: edgeBags })] : []),
    ...(ballastBags !== null && ballastBags > 0
      ? [say('deploymentOrder.lay.ballast', { count: ballastBags })]
      : ballastBags === null && ballast !== null && ballast > 0
        ? [say('deploymentOrder.lay.ballastMass', { mass: mass(ballast) })]
        : []),
    ...(minutes > 0 ? [say('deploymentOrder.lay.late', { minutes })] : []),
  ]
}

/** How hard each size is filled. */
export function airOf({ order, words }: OrderWork): AirBlock {
  const { say, pressure } = words
  const column = (name: string) => say(`deploymentOrder.air.column.${name}`)
  return {
    title: say('deploymentOrder.air.title'),
    columns: {
      tube: column('tube'),
      fill: column('fill'),
      least: column('least'),
      most: column('most'),
    },
    rows: order.air.map(({ tube, fill, least, most }) => {
      const shown = {
        fill: pressure(fill),
        least: least === null ? '' : pressure(least, 'up'),
        most: most === null ? '' : pressure(most, 'down'),
      }
      const parts = [
        say('deploymentOrder.air.fill', { pressure: shown.fill }),
        least === null
          ? say('deploymentOrder.air.noWater')
          : say('deploymentOrder.air.least', { pressure: shown.least }),
        ...(most === null ? [] : [say('deploymentOrder.air.most', { pressure: shown.most })]),
      ]
      return { tube, ...shown, sentence: parts.join(', ') }
    }),
    notes: [say('deploymentOrder.air.plate'), say('deploymentOrder.air.cold')],
  }
}
