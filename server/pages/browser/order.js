// The page of a deployment order: ticks are kept on the phone at once, and sent when there is signal.

/**
 * @typedef {object} Tick
 * @property {string} id
 * @property {string} item
 * @property {boolean} isDone
 * @property {number} at
 * @property {'waiting' | 'sent' | 'refused'} way
 */
/** @typedef {{ item: string, isDone: boolean, at: number }} Known */
/**
 * @typedef {object} State
 * @property {string} status
 * @property {number} expiresAt
 * @property {number | null} withdrawnAt
 * @property {string} reason
 * @property {{ number: number, at: number, token: string } | null} replacedBy
 * @property {readonly Known[]} ticks
 */
/**
 * @typedef {object} Page
 * @property {string} token
 * @property {string} timeZone
 * @property {readonly string[]} files
 * @property {Record<string, string>} words
 */

const page = /** @type {Page} */ (JSON.parse(document.body.dataset.page ?? '{}'))
const API = `/api/orders/${page.token}`
const STORE = `toehold-order-${page.token}`

/** How often the server is asked [ms]: with something to send, and otherwise. */
const SOON = 15_000
const LATER = 60_000

/** Ticks of one delivery. */
const BATCH = 100

/** @type {Tick[]} */
let ticks = readTicks()
/** @type {readonly Known[]} */
let known = []
let isSending = false

/** @returns {Tick[]} */
function readTicks() {
  try {
    const kept = /** @type {unknown} */ (JSON.parse(localStorage.getItem(STORE) ?? '[]'))
    return Array.isArray(kept) ? kept : []
  } catch {
    return []
  }
}

function keepTicks() {
  try {
    localStorage.setItem(STORE, JSON.stringify(ticks))
  } catch {
    // A full or private store: the ticks last as long as the page, and are sent all the same.
  }
}

/** @param {string} key @param {Record<string, string | number>} [values] */
function say(key, values = {}) {
  return (page.words[key] ?? key).replace(/\{(\w+)\}/g, (_, name) => String(values[name] ?? ''))
}

/** "Tue 23:52", in the time zone of the project. @param {number} moment */
function timeOf(moment) {
  const parts = new Intl.DateTimeFormat('en-GB', {
    ...{ timeZone: page.timeZone, weekday: 'short', hourCycle: 'h23' },
    ...{ hour: '2-digit', minute: '2-digit' },
  }).formatToParts(moment)
  const part = (/** @type {string} */ type) => parts.find((one) => one.type === type)?.value ?? ''
  return `${part('weekday')} ${part('hour')}:${part('minute')}`
}

function newId() {
  const bytes = crypto.getRandomValues(new Uint8Array(16))
  return [...bytes].map((byte) => byte.toString(16).padStart(2, '0')).join('')
}

/** @returns {HTMLInputElement[]} */
function boxes() {
  return [...document.querySelectorAll('input')].filter((box) => box.dataset.item !== undefined)
}

/** What was last said of an item, here or on another phone. @param {string} item */
function lastOf(item) {
  const own = ticks.filter((tick) => tick.item === item)
  const others = known.filter((tick) => tick.item === item)
  /** @type {(Known & Partial<Tick>) | undefined} */
  let last
  for (const tick of [...others, ...own]) if (!last || tick.at >= last.at) last = tick
  return last
}

function show() {
  let done = 0
  for (const box of boxes()) {
    const item = box.dataset.item ?? ''
    const last = lastOf(item)
    box.checked = last?.isDone ?? false
    if (box.checked) done += 1
    const row = box.closest('.tick')
    row?.classList.toggle('is-done', box.checked)
    const note = row?.querySelector('.when')
    if (!note) continue
    const isWaiting = last?.way === 'waiting' || last?.way === 'refused'
    const time = last?.isDone ? say('done', { time: timeOf(last.at) }) : ''
    note.textContent = [time, isWaiting ? say('waiting') : ''].filter(Boolean).join(' · ')
  }
  write('progress', say('progress', { done, all: boxes().length }))
  const refused = ticks.filter(({ way }) => way === 'refused').length
  write('lost', refused > 0 ? say('lost', { count: refused }) : '')
}

/** @param {string} id @param {string} text */
function write(id, text) {
  const place = document.getElementById(id)
  if (place && place.textContent !== text) place.textContent = text
}

/** @param {boolean} isOnline */
function showSignal(isOnline) {
  write('signal', say(isOnline ? 'online' : 'offline'))
  document.body.classList.toggle('is-offline', !isOnline)
}

/** @param {State} state */
function take(state) {
  known = state.ticks
  showNotice(state)
  show()
}

/** Says that the order is no longer to be worked by. @param {State} state */
function showNotice({ status, expiresAt, withdrawnAt, reason, replacedBy }) {
  const notice = document.getElementById('notice')
  if (!notice || document.body.dataset.status === status) return
  document.body.dataset.status = status
  notice.hidden = status === 'in-force'
  if (notice.hidden) return
  const moment = replacedBy?.at ?? withdrawnAt ?? expiresAt
  const values = { time: timeOf(moment), reason, number: replacedBy?.number ?? '' }
  notice.textContent = `${say(`notice.${status}`, values)} `
  if (!replacedBy) return
  const link = document.createElement('a')
  link.href = `/order/${replacedBy.token}`
  link.textContent = say('notice.open', { number: replacedBy.number })
  notice.append(link)
}

/** Sends what waits, or only asks. */
async function exchange() {
  if (isSending) return
  isSending = true
  try {
    const waiting = ticks.filter(({ way }) => way === 'waiting').slice(0, BATCH)
    const answer = waiting.length > 0 ? await deliver(waiting) : await fetch(API)
    showSignal(true)
    if (waiting.length > 0) settle(waiting, answer)
    if (answer.ok) take(/** @type {State} */ (await answer.json()))
  } catch {
    showSignal(false)
  } finally {
    isSending = false
    plan()
  }
}

/** @param {readonly Tick[]} waiting */
function deliver(waiting) {
  const body = { ticks: waiting.map(({ id, item, isDone, at }) => ({ id, item, isDone, at })) }
  const headers = { 'content-type': 'application/json' }
  return fetch(`${API}/ticks`, { method: 'POST', headers, body: JSON.stringify(body) })
}

/** What the server cannot take now is tried again. @param {readonly Tick[]} sent @param {Response} answer */
function settle(sent, { ok, status }) {
  const isRefused = status >= 400 && status < 500 && status !== 429
  if (!ok && !isRefused) return
  for (const tick of sent) tick.way = ok ? 'sent' : 'refused'
  keepTicks()
  show()
}

/** @type {number | undefined} */
let timer

function plan() {
  clearTimeout(timer)
  const hasMore = ticks.some(({ way }) => way === 'waiting')
  timer = setTimeout(() => void exchangeIfSeen(), hasMore ? SOON : LATER)
}

async function exchangeIfSeen() {
  if (document.visibilityState === 'visible') await exchange()
  else plan()
}

/** @param {HTMLInputElement} box */
function tickOff(box) {
  const item = box.dataset.item ?? ''
  // Two ticks of one item never carry the same moment, however fast the thumb.
  const at = Math.max(Date.now(), (lastOf(item)?.at ?? 0) + 1)
  ticks = [...ticks, { id: newId(), item, isDone: box.checked, at, way: 'waiting' }]
  keepTicks()
  show()
  void exchange()
}

/** Asks the service worker to keep this page; it needs https, or localhost. */
async function keepPage() {
  const isPossible = 'serviceWorker' in navigator
  if (!isPossible) return write('kept', say('notKept'))
  await navigator.serviceWorker.register('/service-worker.js', { updateViaCache: 'none' })
  const { active } = await navigator.serviceWorker.ready
  const channel = new MessageChannel()
  channel.port1.onmessage = ({ data }) => {
    const { isKept } = /** @type {{ isKept: boolean }} */ (data)
    write('kept', say(isKept ? 'kept' : 'notKept'))
    document.body.dataset.kept = String(isKept)
  }
  active?.postMessage({ keep: [location.pathname, ...page.files] }, [channel.port2])
}

document.addEventListener('change', ({ target }) => {
  if (target instanceof HTMLInputElement && target.dataset.item !== undefined) tickOff(target)
})
window.addEventListener('online', () => void exchange())
window.addEventListener('offline', () => showSignal(false))
document.addEventListener('visibilitychange', () => void exchangeIfSeen())
// Another tab of the same order has ticked something off.
window.addEventListener('storage', ({ key }) => {
  if (key !== STORE) return
  ticks = readTicks()
  show()
})

show()
void exchange()
keepPage().catch(() => {
  // Without signal the worker that is there goes on; it already gave this page.
  if (navigator.serviceWorker.controller) write('kept', say('kept'))
  else write('kept', say('notKept'))
})
