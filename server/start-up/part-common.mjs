import { createHash } from 'node:crypto'
import { readdirSync, readFileSync, renameSync, writeFileSync } from 'node:fs'
import path from 'node:path'

/** Chunks on the way to a student's desk. What they share is loaded by every page; the rest by the pages that need it. */
const FIRST = ['_layout', 'desk', 'live-room', 'index', '[code]']
const HASHED = /^(.+)-([0-9a-f]{32})\.js$/
/** Where a module begins; each is on a line of its own. */
const MODULE_START = /^(?=__d\(function)/m
/** A module's number and what it asks for: a list of numbers, or a map of places to them with addresses of chunks. */
const MODULE_END = /,(\d+),(\[[\d,null]*\]|\{[^{}]*(?:\{[^{}]*\}[^{}]*)*\})\);?\s*$/

function readModules(text) {
  return text.split(MODULE_START).map((part) => {
    // The last is followed by remarks on source maps, which would hide what comes after it.
    const code = `${part.replace(/^\/\/# .*$/gm, '').trimEnd()}\n`
    const [, id, asked] = MODULE_END.exec(code) ?? []
    if (id === undefined) return { id: null, code, asks: [] }
    const list = asked.startsWith('[') ? asked : asked.replace(/"paths":\{[^}]*\}/, '').replace(/"\d+":/g, '')
    return { id, code, asks: list.match(/\d+/g) ?? [] }
  })
}

/**
 * Parts the chunk of everything that two pages share. The bundler puts all of it before every page; here what the first
 * pages do not need goes with each chunk that does. A module that comes twice is defined once: the bundler's runtime
 * passes over the second.
 */
export function partCommon(directory) {
  const folder = path.join(directory, '_expo/static/js/web')
  const files = readdirSync(folder).filter((name) => HASHED.test(name))
  const common = files.find((name) => name.startsWith('__common-'))
  if (!common) return
  const texts = new Map(files.map((name) => [name, readFileSync(path.join(folder, name), 'utf8')]))
  const shared = readModules(texts.get(common))
  const sharedById = new Map(shared.map((module) => [module.id, module]))

  /** Shared modules under a chunk, however deep. */
  const needsOf = (name) => {
    const own = new Map(readModules(texts.get(name)).map((module) => [module.id, module]))
    const seen = new Set()
    const toSee = [...own.keys()]
    for (const id of toSee) {
      if (seen.has(id)) continue
      seen.add(id)
      toSee.push(
        ...((own.get(id) ?? sharedById.get(id))?.asks ?? []).filter(
          (asked) => own.has(asked) || sharedById.has(asked),
        ),
      )
    }
    return new Set([...seen].filter((id) => sharedById.has(id)))
  }

  const page = readFileSync(path.join(directory, 'index.html'), 'utf8')
  // A worker has its own runtime and all of its modules.
  const chunks = files.filter((name) => !page.includes(name) && texts.get(name).startsWith('__d('))
  const needs = new Map(chunks.map((name) => [name, needsOf(name)]))
  const first = new Set(
    chunks.filter((name) => FIRST.includes(HASHED.exec(name)[1])).flatMap((name) => [...needs.get(name)]),
  )
  const isFirst = ({ id }) => id === null || first.has(id)
  for (const name of chunks) {
    const more = shared.filter((module) => !isFirst(module) && needs.get(name).has(module.id))
    texts.set(name, [...more.map(({ code }) => code), texts.get(name)].join(''))
  }
  texts.set(
    common,
    shared
      .filter(isFirst)
      .map(({ code }) => code)
      .join(''),
  )

  // Every name tells of its content: each new one of the old, and of all that was parted.
  const [, , commonHash] = HASHED.exec(common)
  const renamed = new Map(
    files.map((name) => {
      const [, , hash] = HASHED.exec(name)
      return [hash, createHash('md5').update(hash).update(commonHash).digest('hex')]
    }),
  )
  const rename = (text) => text.replace(/[0-9a-f]{32}(?=\.js)/g, (hash) => renamed.get(hash) ?? hash)
  for (const [name, text] of texts) {
    writeFileSync(path.join(folder, name), rename(text))
    renameSync(path.join(folder, name), path.join(folder, rename(name)))
  }
  writeFileSync(path.join(directory, 'index.html'), rename(page))
}
