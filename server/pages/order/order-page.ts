import { sceneToSvg } from '../../../shared/drawing/scene-to-svg'
import type { ThemeName } from '../../../shared/drawing/paints'
import { composeOrder } from '../../../shared/order/compose-order'
import type { OrderDocument, TextBlock } from '../../../shared/order/order-document'
import { orderResolver, orderWords } from '../../../shared/order/order-words'
import type { Order } from '../../../shared/schemas/order'
import type { OrderState } from '../../../shared/schemas/order-api'
import { textResolver } from '../../../shared/texts/format-text'
import { orderPageTexts } from '../../../shared/texts/order-page.en'
import { markup, type Markup, NOTHING } from '../markup'
import type { PageFiles } from '../page-files'
import { document } from './document'
import { airBlock, keyFacts, layBlock, loadBlock, plugBlock, roundBlock } from './order-parts'
import { SCRIPT_WORDS } from './page-words'

/** An order as its page shows it. */
export interface ShownOrder {
  readonly order: Order
  readonly token: string
  readonly state: OrderState
}

/** The page of an order: whole without a script, which only keeps and sends the ticks. */
export function orderPage(shown: ShownOrder, files: PageFiles): string {
  const { order, token, state } = shown
  const words = composeOrder(order)
  const script = {
    ...{ token, timeZone: order.timeZone, files: files.addresses, words: SCRIPT_WORDS },
  }
  const body = markup`<body data-page="${JSON.stringify(script)}" data-status="${state.status}">
${headOf(words)}
${noticeOf(shown)}
<main>
${keyFacts(words.keys)}
${jumps()}
${textBlock(words.forecast, 'forecast')}
${loadBlock(words.load)}
${plugBlock(words.plugs)}
${skirtOf(order, words.skirt)}
${layBlock(words.lay)}
${airBlock(words.air)}
${textBlock(words.ballast, 'ballast')}
${textBlock(words.times, 'times')}
${textBlock(words.leave, 'leave')}
${roundBlock(words.rounds)}
${listBlock(words.retrieve.title, words.retrieve.steps, 'ol')}
${listBlock(words.cautions.title, words.cautions.lines, 'ul')}
</main>
${footOf(words, token)}
${statusBar()}
</body>`
  return document({ title: words.windowTitle, body, files, hasScript: true })
}

function headOf({ title, place, site, issue, verdict, note }: OrderDocument): Markup {
  const issued = issue.map((part) => markup`<span>${part}</span> `)
  const answers = verdict.answers.map((answer) => markup` <span>${answer}</span>`)
  return markup`<header>
<h1>${title}</h1>
<p class="place">${place}</p>
${site === '' ? NOTHING : markup`<p class="quiet">${site}</p>`}
<p class="quiet issue">${issued}</p>
<p class="verdict ${verdict.id}"><b>${verdict.word}</b>${answers}</p>
${note === '' ? NOTHING : markup`<p class="note">${note}</p>`}
</header>`
}

/** What stands over an order that is no longer to be worked by; the script keeps it up to date. */
function noticeOf({ order, state }: ShownOrder): Markup {
  const { status, replacedBy, withdrawnAt, expiresAt, reason } = state
  if (status === 'in-force') return markup`<p id="notice" class="notice" role="alert" hidden></p>`
  const { time } = orderWords(order)
  const resolve = textResolver(orderPageTexts, order.units)
  const moment = replacedBy?.at ?? withdrawnAt ?? expiresAt
  const number = replacedBy?.number ?? ''
  const values = { time: time(moment), reason, number }
  const text = resolve({ key: `notice.${status}`, values })
  const link = replacedBy
    ? markup` <a href="/order/${replacedBy.token}">${resolve({ key: 'notice.open', values })}</a>`
    : NOTHING
  return markup`<p id="notice" class="notice" role="alert">${text}${link}</p>`
}

function jumps(): Markup {
  const { contents, jump } = orderPageTexts.page
  const links = (['plug', 'lay', 'leave', 'round'] as const).map(
    (id) => markup`<a href="#${id}">${jump[id]}</a>`,
  )
  return markup`<nav aria-label="${contents}">${links}</nav>`
}

function textBlock({ title, lines }: TextBlock, id: string): Markup {
  if (lines.length === 0) return NOTHING
  const rows = lines.map((line) => markup`<p>${line}</p>`)
  return markup`<section id="${id}"><h2>${title}</h2>${rows}</section>`
}

function listBlock(title: string, lines: readonly string[], kind: 'ol' | 'ul'): Markup {
  const rows = lines.map((line) => markup`<li>${line}</li>`)
  const list = kind === 'ol' ? markup`<ol>${rows}</ol>` : markup`<ul>${rows}</ul>`
  return markup`<section><h2>${title}</h2>${list}</section>`
}

/** The picture by day and by night; it stands in the page, so that it is there without signal. */
function skirtOf({ units }: Order, { title, text, scene }: OrderDocument['skirt']): Markup {
  const resolve = orderResolver(units)
  const source = (theme: ThemeName) => {
    const svg = sceneToSvg(scene, { resolve, theme })
    return `data:image/svg+xml,${encodeURIComponent(svg)}`
  }
  const alt = scene.description.map(resolve).join(' ')
  return markup`<section id="skirt"><h2>${title}</h2>
<picture><source media="(prefers-color-scheme: dark)" srcset="${source('dark')}">
<img src="${source('light')}" alt="${alt}" width="${scene.width}" height="${scene.height}"></picture>
<p>${text}</p></section>`
}

function footOf({ source }: OrderDocument, token: string): Markup {
  return markup`<footer><p><a class="button" href="/api/orders/${token}/order.pdf">${orderPageTexts.page.pdf}</a></p>
<p class="quiet">${source}</p></footer>`
}

/** At the lower edge, where a thumb is: how far it is, and whether there is signal. */
function statusBar(): Markup {
  return markup`<div class="bar" role="status"><b id="progress"></b>
<span id="signal"></span><span id="kept"></span><span id="lost"></span></div>`
}
