// The service worker of the whole origin. It keeps what is needed without signal and leaves everything
// else to the browser. A further place of the program is one more entry in PLACES.

/** Changes with every file that pages from the server load. */
const VERSION = 'development'

/** What pages of the program are kept, and which files they need. */
const PLACES = [
  {
    /** Pages: always the newest where there is signal. */
    isPage: (/** @type {string} */ path) => /^\/order\/[^/]+$/.test(path),
    /** Files whose address changes with what is in them. */
    isFile: (/** @type {string} */ path) => path.startsWith('/order-page/'),
  },
]

const PREFIX = 'toehold-pages-'
const CACHE = PREFIX + VERSION

/** So many pages and files are kept; the oldest go first. */
const MOST_PAGES = 20
const MOST_FILES = 40

/** With a kept page at hand, a slow network is waited for so long [ms]. */
const PATIENCE = 4000

const worker = /** @type {ServiceWorkerGlobalScope} */ (/** @type {unknown} */ (self))

worker.addEventListener('install', () => {
  void worker.skipWaiting()
})

worker.addEventListener('activate', (event) => {
  event.waitUntil(takeOver())
})

worker.addEventListener('fetch', (event) => {
  const { request } = event
  const url = new URL(request.url)
  if (request.method !== 'GET' || url.origin !== worker.location.origin) return
  if (request.mode === 'navigate' && PLACES.some(({ isPage }) => isPage(url.pathname))) {
    event.respondWith(newestPage(event, url))
  } else if (PLACES.some(({ isFile }) => isFile(url.pathname))) {
    event.respondWith(keptFile(request))
  }
})

/** A page asks for itself and its files to be kept, and learns whether they are. */
worker.addEventListener('message', (event) => {
  const wanted = /** @type {{ keep?: unknown }} */ (event.data)
  if (!Array.isArray(wanted.keep)) return
  const addresses = wanted.keep.filter(isOurs)
  event.waitUntil(
    keepAll(addresses).then(
      () => event.ports[0]?.postMessage({ isKept: true }),
      () => event.ports[0]?.postMessage({ isKept: false }),
    ),
  )
})

/** @param {unknown} address */
function isOurs(address) {
  if (typeof address !== 'string') return false
  const url = new URL(address, worker.location.origin)
  const isPlace = PLACES.some(({ isPage, isFile }) => isPage(url.pathname) || isFile(url.pathname))
  return url.origin === worker.location.origin && isPlace
}

/** Brings what earlier versions kept along, so that an update takes no page away. */
async function takeOver() {
  const cache = await caches.open(CACHE)
  for (const name of await caches.keys()) {
    if (!name.startsWith(PREFIX) || name === CACHE) continue
    const old = await caches.open(name)
    for (const request of await old.keys()) {
      const kept = await old.match(request)
      if (kept && !(await cache.match(request))) await cache.put(request, kept)
    }
    await caches.delete(name)
  }
  await trim(cache)
  await worker.clients.claim()
}

/** @param {readonly string[]} addresses */
async function keepAll(addresses) {
  const cache = await caches.open(CACHE)
  await Promise.all(
    addresses.map(async (address) => {
      const { pathname } = new URL(address, worker.location.origin)
      const isThere = (await cache.match(pathname)) !== undefined
      if (isThere && PLACES.some((place) => place.isFile(pathname))) return
      const answer = await fetch(pathname).catch(() => null)
      if (answer?.ok) await cache.put(pathname, answer)
      else if (!isThere) throw new Error(`${pathname} cannot be kept`)
    }),
  )
  await trim(cache)
}

/** @param {Cache} cache */
async function trim(cache) {
  const keys = await cache.keys()
  const isPage = (/** @type {Request} */ { url }) =>
    PLACES.some((place) => place.isPage(new URL(url).pathname))
  const pages = keys.filter(isPage)
  const files = keys.filter((key) => !isPage(key))
  const tooMany = [
    ...pages.slice(0, Math.max(0, pages.length - MOST_PAGES)),
    ...files.slice(0, Math.max(0, files.length - MOST_FILES)),
  ]
  await Promise.all(tooMany.map((request) => cache.delete(request)))
}

/**
 * The page from the network; without signal, or with very little, the one that was kept.
 *
 * @param {FetchEvent} event
 * @param {URL} url
 */
async function newestPage(event, { pathname }) {
  const cache = await caches.open(CACHE)
  const kept = await cache.match(pathname)
  const fresh = fetch(event.request).then(async (answer) => {
    if (answer.ok) await cache.put(pathname, answer.clone())
    return answer
  })
  if (!kept) return fresh
  event.waitUntil(fresh.catch(() => undefined))
  const patience = new Promise((resolve) => setTimeout(() => resolve(kept), PATIENCE))
  const usable = fresh.then(
    (answer) => (answer.status >= 500 ? kept : answer),
    () => kept,
  )
  return /** @type {Promise<Response>} */ (Promise.race([usable, patience]))
}

/** @param {Request} request */
async function keptFile(request) {
  const cache = await caches.open(CACHE)
  const kept = await cache.match(request)
  if (kept) return kept
  const answer = await fetch(request)
  if (answer.ok) await cache.put(request, answer.clone())
  return answer
}
