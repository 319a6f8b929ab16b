/** The parts of a Vite manifest that decide what a page loads. */
export interface ManifestChunk {
  readonly file: string
  readonly imports?: readonly string[]
  readonly css?: readonly string[]
}
export type Manifest = Readonly<Record<string, ManifestChunk>>

/** Which modules went into which script; written by the plugin in vite.config.ts. */
export type Modules = Readonly<Record<string, readonly string[]>>

/** Too large for the first page; each belongs to a page that loads it when it is opened. */
const KEPT_OUT = /(^|\/)node_modules\/(mathjs|katex|chart\.js)\//

/**
 * Script and style that the browser must have before the place shows: the entries, everything
 * that they import statically, and the styles of all of these.
 */
export function firstLoad(manifest: Manifest, entries: readonly string[]): string[] {
  const seen = new Set<string>()
  const files = new Set<string>()
  const visit = (key: string) => {
    if (seen.has(key)) return
    seen.add(key)
    const chunk = manifest[key]
    if (!chunk) throw new Error(`${key}: the manifest of the build has no such entry`)
    files.add(chunk.file)
    chunk.css?.forEach((file) => files.add(file))
    chunk.imports?.forEach(visit)
  }
  entries.forEach(visit)
  return [...files]
}

/** Scripts and styles that the page itself names; a file of public/ is in no manifest. */
export function namedByPage(html: string): string[] {
  const tags = html.match(/<(?:script|link)\b[^>]*>/g) ?? []
  return tags
    .filter((tag) => tag.startsWith('<script') || /rel="stylesheet"/.test(tag))
    .flatMap((tag) => /(?:src|href)="\/([^"]+)"/.exec(tag)?.[1] ?? [])
}

/** Entry of the manifest whose script holds the module, be it a chunk of its own or not. */
export function entryOf(module: string, manifest: Manifest, modules: Modules): string {
  const entry = Object.keys(manifest).find((key) => modules[manifest[key]!.file]?.includes(module))
  if (!entry) throw new Error(`${module}: no script of the build holds it`)
  return entry
}

/** Modules among these files that the first page must not load. */
export function keptOutModules(modules: Modules, files: readonly string[]): string[] {
  return files.flatMap((file) => modules[file] ?? []).filter((id) => KEPT_OUT.test(id))
}
