import { markup, type Markup, NOTHING } from '../markup'
import type { PageFiles } from '../page-files'

interface Parts {
  readonly title: string
  readonly body: Markup
  readonly files: PageFiles
  readonly hasScript: boolean
}

/** A whole page. It loads its own style, fonts and script, and nothing else. */
export function document({ title, body, files, hasScript }: Parts): string {
  const font = files.addressOf('plex-400.woff2')
  const script = hasScript
    ? markup`<script src="${files.addressOf('order.js')}" defer></script>`
    : NOTHING
  return markup`<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta name="viewport" content="width=device-width, initial-scale=1">
<meta name="robots" content="noindex">
<meta name="color-scheme" content="light dark">
<meta name="theme-color" media="(prefers-color-scheme: light)" content="#f7f6f2">
<meta name="theme-color" media="(prefers-color-scheme: dark)" content="#12202a">
<title>${title}</title>
<link rel="icon" href="data:,">
<link rel="preload" href="${font}" as="font" type="font/woff2" crossorigin>
<link rel="stylesheet" href="${files.addressOf('order.css')}">
${script}
</head>
${body}
</html>
`.toString()
}

/** A page that says why there is no order. */
export function messagePage(title: string, text: string, files: PageFiles): string {
  const body = markup`<body><main class="message"><h1>${title}</h1><p>${text}</p></main></body>`
  return document({ title, body, files, hasScript: false })
}
