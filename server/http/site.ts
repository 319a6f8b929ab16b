import { existsSync } from 'node:fs'
import { extname, join } from 'node:path'
import express, { type RequestHandler, Router } from 'express'

const PAGE = 'index.html'
const ONE_YEAR = '1y'

/** The built page: its hashed files for ever, everything else asked for anew each time. */
export function site(folder: string): Router {
  const router = Router()
  router.use(
    '/assets',
    express.static(join(folder, 'assets'), { immutable: true, maxAge: ONE_YEAR, index: false }),
  )
  router.use(express.static(folder, { setHeaders: (res) => res.set('Cache-Control', 'no-cache') }))
  router.use(pageOfAnyPlace(folder))
  return router
}

/** Places of the program are addresses of one page; a file that is missing is not a place. */
function pageOfAnyPlace(folder: string): RequestHandler {
  return (req, res, next) => {
    const isPlace =
      (req.method === 'GET' || req.method === 'HEAD') &&
      !/^\/api(\/|$)/.test(req.path) &&
      extname(req.path) === '' &&
      req.accepts('html') === 'html' &&
      existsSync(join(folder, PAGE))
    if (!isPlace) {
      next()
      return
    }
    res.set('Cache-Control', 'no-cache')
    // With a root, a hidden folder above the project does not hide the page.
    res.sendFile(PAGE, { root: folder })
  }
}
