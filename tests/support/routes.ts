import type { Express } from 'express'

interface Layer {
  readonly route?: {
    readonly path: string
    readonly stack: readonly { readonly method?: string }[]
  }
  readonly handle?: { readonly stack?: readonly Layer[] }
}

/** Every route that Express really has, as "get /api/projects/:projectId". */
export function routesOf(app: Express): readonly string[] {
  return inLayers(app.router.stack as unknown as readonly Layer[])
}

function inLayers(layers: readonly Layer[]): readonly string[] {
  return layers.flatMap(({ route, handle }) => {
    if (!route) return inLayers(handle?.stack ?? [])
    const methods = route.stack.flatMap(({ method }) => method ?? [])
    return [...new Set(methods)].map((method) => `${method} ${route.path}`)
  })
}
