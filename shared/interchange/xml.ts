import { DOMParser } from '@xmldom/xmldom'
import type { ReadingProblem } from '@/shared/interchange/reading-problem'
import { fail, ok, type Result } from '@/shared/result'

/** A score of forty bars with everything a notation program adds is far smaller. */
export const MAX_XML_CHARACTERS = 3_000_000
const MAX_DEPTH = 32
const ELEMENT_NODE = 1
const TEXT_NODES: ReadonlySet<number> = new Set([3, 4])

/** One element of a document: its name, its attributes, what it holds. */
export type XmlElement = Readonly<{
  name: string
  attributes: Readonly<Record<string, string>>
  children: readonly XmlElement[]
  /** The text it holds itself, trimmed. */
  text: string
}>

const problem = (message: string): Result<never, ReadingProblem> => fail({ code: 'not-music', message })

/**
 * Reads an XML document. Documents that declare entities are refused before they are parsed, and anything the parser
 * complains of is refused too; what a DOCTYPE points at is never fetched.
 */
export function parseXml(text: string): Result<XmlElement, ReadingProblem> {
  if (text.length > MAX_XML_CHARACTERS) return problem('The file is too large to be one exercise.')
  // In whatever case: a stricter reader elsewhere must not be handed what this one overlooked.
  if (/<!\s*(?:ENTITY|ELEMENT|ATTLIST|NOTATION)/i.test(text) || /<!DOCTYPE[^>]*\[/i.test(text)) {
    return problem('The file declares entities of its own; it is not read.')
  }
  let complaint: string | null = null
  const complain = (message: unknown): void => void (complaint ??= String(message))
  let root: Element | null = null
  try {
    const parser = new DOMParser({
      errorHandler: { warning: complain, error: complain, fatalError: complain },
    })
    root = parser.parseFromString(text, 'text/xml')?.documentElement ?? null
  } catch (error) {
    complain(error)
  }
  if (complaint !== null || !root) return problem('The file is not well-formed XML.')
  const element = elementOf(root, 0)
  return element ? ok(element) : problem('The file is nested too deeply to be a score.')
}

function elementOf(node: Element, depth: number): XmlElement | null {
  if (depth > MAX_DEPTH) return null
  const children: XmlElement[] = []
  let text = ''
  for (let child = node.firstChild; child; child = child.nextSibling) {
    if (TEXT_NODES.has(child.nodeType)) text += child.nodeValue ?? ''
    if (child.nodeType !== ELEMENT_NODE) continue
    const element = elementOf(child as Element, depth + 1)
    if (!element) return null
    children.push(element)
  }
  const attributes: Record<string, string> = {}
  for (let index = 0; index < node.attributes.length; index += 1) {
    const attribute = node.attributes.item(index)
    if (attribute) attributes[attribute.name] = attribute.value
  }
  return { name: node.nodeName, attributes, children, text: text.trim() }
}

export const childNamed = ({ children }: XmlElement, name: string): XmlElement | undefined =>
  children.find((child) => child.name === name)

export const childrenNamed = ({ children }: XmlElement, name: string): readonly XmlElement[] =>
  children.filter((child) => child.name === name)

/** The text of a child, or `null` where there is no such child. */
export const textOf = (element: XmlElement, name: string): string | null =>
  childNamed(element, name)?.text ?? null

const ESCAPES: Readonly<Record<string, string>> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;' }

/** A text that may stand in an element or an attribute; characters that XML forbids are left out. */
export const escapeXml = (text: string): string =>
  text
    .replace(/[^\t\n\r\u0020-\ud7ff\ue000-\ufffd\u{10000}-\u{10ffff}]/gu, '')
    .replace(/[&<>"]/g, (character) => ESCAPES[character] as string)
