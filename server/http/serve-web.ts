import { existsSync } from 'node:fs'
import path from 'node:path'
import express, { Router, type RequestHandler, type Response } from 'express'
import { Refused } from '@/server/errors/refused'

/** Files whose name holds a hash of their contents never change. */
const HASHED = /[.-][0-9a-f]{8,}\.[a-z0-9]+(\.(br|gz))?$/i
/** How the name of a file ends. A wall link holds a dot too, with a long signature after it. */
const FILE_ENDING = /\.[a-z0-9]{1,8}$/i
const YEAR_SECONDS = 365 * 24 * 60 * 60
const ENCODINGS = [
  { token: 'br', ending: '.br' },
  { token: 'gzip', ending: '.gz' },
] as const

function setFreshness(response: Response, file: string): void {
  const isHashed = HASHED.test(path.basename(file)) && file.includes(`${path.sep}_expo${path.sep}`)
  const isAsset = HASHED.test(path.basename(file)) && file.includes(`${path.sep}assets${path.sep}`)
  response.setHeader(
    'Cache-Control',
    isHashed || isAsset ? `public, max-age=${YEAR_SECONDS}, immutable` : 'no-cache',
  )
}

/** The path that an address names, or null for an address that is no text: half a letter, escaped. */
function decodedPath(address: string): string | null {
  try {
    return decodeURIComponent(address)
  } catch {
    return null
  }
}

/** Serves the compressed twin of a file where the build made one and the browser takes it. */
const serveCompressed =
  (directory: string): RequestHandler =>
  (request, response, next) => {
    const accepted = request.acceptsEncodings()
    const file = path.join(directory, path.normalize(decodedPath(request.path) ?? ''))
    if (!file.startsWith(directory + path.sep)) return next()
    const twin = ENCODINGS.find(({ token, ending }) => accepted.includes(token) && existsSync(file + ending))
    if (!twin) return next()
    response.type(path.extname(file))
    response.setHeader('Content-Encoding', twin.token)
    response.vary('Accept-Encoding')
    setFreshness(response, file)
    response.sendFile(file + twin.ending, { cacheControl: false })
  }

/** The exported web client: its files, and its one page for every address that is a screen's. */
export function serveWeb(directory: string): Router {
  const router = Router()
  const page = path.join(directory, 'index.html')
  router.use((request, _response, next) => {
    const isAsked = request.method === 'GET' || request.method === 'HEAD'
    next(isAsked && decodedPath(request.path) !== null ? undefined : new Refused('not-found'))
  })
  router.use(serveCompressed(directory))
  router.use(
    express.static(directory, {
      index: false,
      cacheControl: false,
      dotfiles: 'ignore',
      redirect: false,
      setHeaders: (response, file) => setFreshness(response as Response, file),
    }),
  )
  router.get('/{*screen}', (request, response, next) => {
    // What looks like a file and is none must not be answered with a page.
    if (FILE_ENDING.test(request.path) || !existsSync(page)) return next(new Refused('not-found'))
    request.url = '/index.html'
    return serveCompressed(directory)(request, response, () => {
      setFreshness(response, page)
      response.sendFile(page, { cacheControl: false })
    })
  })
  return router
}
