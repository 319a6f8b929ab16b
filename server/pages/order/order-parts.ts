import type {
  AirBlock,
  KeyFact,
  LayBlock,
  LayRow,
  LoadBlock,
  PlugBlock,
  RoundBlock,
  TickRow,
} from '../../../shared/order/order-document'
import { markup, type Markup, NOTHING } from '../markup'

/** The facts that everybody must know, large. */
export function keyFacts(keys: readonly KeyFact[]): Markup {
  const facts = keys.map(
    ({ id, label, value, more }) => markup`<div class="key ${id}"><dt>${label}</dt>
<dd><b>${value}</b>${more === '' ? NOTHING : markup`<span>${more}</span>`}</dd></div>`,
  )
  return markup`<dl class="keys">${facts}</dl>`
}

/** The whole row is the target, so that a wet thumb meets it. */
function tickRow(id: string, label: string, content: Markup): Markup {
  return markup`<li><label class="tick" for="${id}"><input type="checkbox" id="${id}" data-item="${id}" aria-label="${label}" autocomplete="off">
<span class="what">${content}<output class="when"></output></span></label></li>`
}

export function plugBlock({ title, lead, none, rows }: PlugBlock): Markup {
  if (rows.length === 0) {
    return markup`<section id="plug"><h2>${title}</h2><p>${none}</p></section>`
  }
  const ticks = rows.map(({ id, text, more, label }: TickRow) =>
    tickRow(
      id,
      label,
      markup`<b>${text}</b>${more === '' ? NOTHING : markup`<span>${more}</span>`}`,
    ),
  )
  return markup`<section id="plug"><h2>${title}</h2><p>${lead}</p><ul class="ticks">${ticks}</ul></section>`
}

export function layBlock({ title, lead, rows, unlaid }: LayBlock): Markup {
  const warnings = unlaid.map((text) => markup`<p class="warn">${text}</p>`)
  const ticks = rows.map((row) => tickRow(row.id, row.label, sectionOf(row)))
  return markup`<section id="lay"><h2>${title}</h2><p>${lead}</p>${warnings}
<ol class="ticks">${ticks}</ol></section>`
}

function sectionOf(row: LayRow): Markup {
  const { position, place, tube, hours, isLate, fails, extras } = row
  const late = isLate ? ' late' : ''
  const line = (text: string, kind: string) =>
    text === '' ? NOTHING : markup`<span class="${kind}">${text}</span>`
  return markup`<b><i>${position}</i> ${place} · ${tube}</b>
${line(hours, `hours${late}`)}
${line(extras.join(' · '), 'extra')}${line(fails, 'warn')}`
}

export function loadBlock({ title, depot, rows, also }: LoadBlock): Markup {
  const cells = rows.map(
    ({ label, value }) => markup`<tr><th scope="row">${label}</th><td>${value}</td></tr>`,
  )
  return markup`<section id="load"><h2>${title}</h2>${depot === '' ? NOTHING : markup`<p><b>${depot}</b></p>`}
<table><tbody>${cells}</tbody></table><p>${also}</p></section>`
}

export function airBlock({ title, rows, notes }: AirBlock): Markup {
  const tubes = rows.map(({ tube, sentence }) => markup`<p><b>${tube}</b><br>${sentence}</p>`)
  return markup`<section id="air"><h2>${title}</h2>${tubes}${notes.map((note) => markup`<p>${note}</p>`)}</section>`
}

export function roundBlock(rounds: RoundBlock): Markup {
  const rows = rounds.rows.map((row) => markup`<div><dt>${row.when}</dt><dd>${row.do}</dd></div>`)
  const hours = rounds.hours.map(
    ({ time, shown }) => markup`<tr><th scope="row">${time}</th><td>${shown}</td></tr>`,
  )
  const table =
    hours.length === 0
      ? NOTHING
      : markup`<h3>${rounds.hoursTitle}</h3><table class="hours"><tbody>${hours}</tbody></table>`
  return markup`<section id="round"><h2>${rounds.title}</h2><p>${rounds.lead}</p>
<dl class="triggers">${rows}</dl>${table}</section>`
}
