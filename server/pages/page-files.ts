import { createHash } from 'node:crypto'
import { readFileSync } from 'node:fs'
import { createRequire } from 'node:module'

/** A file that pages from the server load. */
export interface PageFile {
  readonly name: string
  readonly mediaType: string
  readonly bytes: Buffer
}

/** Files under one address that changes with what is in them, so that they may be kept for ever. */
export interface PageFiles {
  /** Of all files together. */
  readonly version: string
  readonly find: (name: string) => PageFile | undefined
  readonly addressOf: (name: string) => string
  readonly addresses: readonly string[]
  /** The service worker, which carries the version. */
  readonly serviceWorker: string
}

/** Where the files lie; the service worker knows it too. */
export const FILES_PATH = '/order-page'

/** At the root, so that its scope is the whole origin. */
export const WORKER_PATH = '/service-worker.js'

const require = createRequire(import.meta.url)
const inBrowser = (name: string) => readFileSync(new URL(`browser/${name}`, import.meta.url))
const inFonts = (name: string) =>
  readFileSync(require.resolve(`@fontsource/ibm-plex-sans/files/ibm-plex-sans-${name}.woff2`))

const VERSION_MARK = "'development'"

/** Reads the files once. One face of the font is enough for a page that a phone loads in the rain. */
export function readPageFiles(): PageFiles {
  const files: readonly PageFile[] = [
    { name: 'order.css', mediaType: 'text/css; charset=utf-8', bytes: inBrowser('order.css') },
    { name: 'order.js', mediaType: 'text/javascript; charset=utf-8', bytes: inBrowser('order.js') },
    { name: 'plex-400.woff2', mediaType: 'font/woff2', bytes: inFonts('latin-400-normal') },
  ]
  const worker = inBrowser('service-worker.js').toString('utf8')
  const hash = createHash('sha256').update(worker)
  for (const { bytes } of files) hash.update(bytes)
  const version = hash.digest('hex').slice(0, 12)
  const addressOf = (name: string) => `${FILES_PATH}/${version}/${name}`
  return {
    version,
    find: (name) => files.find((file) => file.name === name),
    addressOf,
    addresses: files.map(({ name }) => addressOf(name)),
    serviceWorker: worker.replace(VERSION_MARK, `'${version}'`),
  }
}
