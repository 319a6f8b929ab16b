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
          label: say('order.load.ballastBags'),
          value: say('order.load.short', { count: wanted, inStore }),
        },
      ]
    : row('order.load.ballastBags', wanted)
  const pipes = plugs.filter(({ diameter }) => diameter !== null)
  return {
    title: say('order.load.title'),
    depot: store.depot === null ? '' : say('order.load.depot', { depot: store.depot }),
    rows: [
      ...air.map(({ tube, pieces }) => ({ label: tube, value: String(pieces) })),
      ...row('order.load.closures', store.closures),
      ...row('order.load.edgeBags', store.edgeBags),
      ...ballast,
      ...row('order.load.plugs', pipes.length),
      ...row('order.load.blowers', store.blowers),
      ...row('order.load.crews', store.pairs),
    ],
    also: say('order.load.always'),
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
    const text = say(`order.plug.${key}`, values)
    const { offset } = plug
    const side = offset === null || offset === 0 ? '' : offset > 0 ? 'dry' : 'wet'
    const where =
      side === '' ? '' : say(`order.plug.${side}`, { distance: size(Math.abs(offset ?? 0)) })
    const waits = plug.flows ? '' : say('order.plug.waits')
    return {
      id: `plug-${i + 1}`,
      text,
      more: [where, plug.note, waits].filter((part) => part !== '').join('. '),
      label: say('order.tick.mark', { what: text }),
    }
  })
  return {
    title: say('order.plug.title'),
    lead: say('order.plug.lead'),
    none: say('order.plug.none'),
    rows,
  }
}

/** The picture that says which side the water is on. */
export function skirtOf({ words }: OrderWork): OrderDocument['skirt'] {
  return {
    title: words.say('order.skirt.title'),
    text: words.say('order.skirt.text'),
    scene: skirtPicture(),
  }
}

/** The sections in the order in which they are laid. */
export function layOf(work: OrderWork): LayBlock {
  const { order, words } = work
  const { say, chainage } = words
  const column = (name: LayColumn) => say(`order.lay.column.${name}`)
  return {
    title: say('order.lay.title'),
    lead: say('order.lay.lead'),
    columns: {
      ...{ position: column('position'), place: column('place'), tube: column('tube') },
      ...{ pair: column('pair'), times: column('times'), water: column('water') },
      ...{ edgeBags: column('edgeBags'), ballast: column('ballast'), bend: column('bend') },
    },
    rows: order.sections.map((section) => layRow(work, section)),
    unlaid: order.unlaid.map(({ from, to }) =>
      say('order.answer.unlaid', { from: chainage(from), to: chainage(to) }),
    ),
  }
}

const some = (count: number | null): string => (count === null || count === 0 ? '' : String(count))

function layRow(work: OrderWork, section: OrderSection): LayRow {
  const { say, chainage, time } = work.words
  const { position, from, to, tube, pair, start, finish, deadline, margin, verdict } = section
  return {
    id: `section-${position}`,
    position,
    place: say('order.lay.place', { from: chainage(from), to: chainage(to) }),
    tube,
    pair: some(pair),
    edgeBags: some(section.edgeBags),
    ballast: ballastOf(work, section),
    bend: bendOf(work, section),
    times: start === null || finish === null ? '' : span(time(start), time(finish)),
    water: deadline === null ? '' : time(deadline),
    extras: extrasOf(work, section),
    isLate: margin !== null && margin < 0,
    fails: verdict === 'fails' ? say('order.lay.fails') : '',
    label: say('order.lay.done', { position }),
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
  const side = words.say(turn > 0 ? 'order.lay.left' : 'order.lay.right')
  return words.say('order.lay.bend', { degrees, side })
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
    ...(bend === '' ? [] : [say('order.lay.bends', { bend })]),
    ...(edgeBags > 0 ? [say('order.lay.edge', { count: edgeBags })] : []),
    ...(ballastBags !== null && ballastBags > 0
      ? [say('order.lay.ballast', { count: ballastBags })]
      : ballastBags === null && ballast !== null && ballast > 0
        ? [say('order.lay.ballastMass', { mass: mass(ballast) })]
        : []),
    ...(minutes > 0 ? [say('order.lay.late', { minutes })] : []),
  ]
}

/** How hard each size is filled. */
export function airOf({ order, words }: OrderWork): AirBlock {
  const { say, pressure } = words
  const column = (name: string) => say(`order.air.column.${name}`)
  return {
    title: say('order.air.title'),
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
        say('order.air.fill', { pressure: shown.fill }),
        least === null
          ? say('order.air.noWater')
          : say('order.air.least', { pressure: shown.least }),
        ...(most === null ? [] : [say('order.air.most', { pressure: shown.most })]),
      ]
      return { tube, ...shown, sentence: parts.join(', ') }
    }),
    notes: [say('order.air.plate'), say('order.air.cold')],
  }
}
