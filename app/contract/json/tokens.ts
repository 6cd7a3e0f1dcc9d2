/**
 * The smallest parts of strict JSON: where a string, a number or a word ends, or why it cannot be one.
 *
 * Shapes   text and an offset; the offset after the part, or a fault with the offset it lies at.
 * Source   RFC 8259.
 */
import { visible } from '../fault.ts'

export interface SyntaxFault {
  readonly at: number
  readonly message: string
}

/** The offset after spaces, tabs and line ends. */
export const skipSpace = (text: string, from: number): number => {
  let at = from
  for (;;) {
    const c = text.charCodeAt(at)
    if (c !== 0x20 && c !== 0x0a && c !== 0x0d && c !== 0x09) return at
    at++
  }
}

/** The end of a string that begins at the quotation mark. */
export const endOfString = (text: string, from: number): number | SyntaxFault => {
  for (let at = from + 1; at < text.length; at++) {
    const c = text.charCodeAt(at)
    if (c === 0x22) return at + 1
    if (c < 0x20) {
      const what =
        c === 0x0a || c === 0x0d ? 'a line end' : `the control character ${visible(text.charAt(at))}`
      return { at, message: `a string holds ${what}; close it with " or write the character as an escape` }
    }
    if (c !== 0x5c) continue
    at++
    const letter = text.charAt(at)
    if (letter === 'u') {
      if (!fourHex.test(text.slice(at + 1, at + 5))) {
        return { at: at - 1, message: 'an escape \\u needs four hexadecimal digits after it' }
      }
      at += 4
    } else if (letter === '' || !escapes.includes(letter)) {
      return {
        at: at - 1,
        message: `"\\${visible(letter)}" is not an escape of JSON; a backslash itself is written "\\\\"`,
      }
    }
  }
  return { at: from, message: 'a string that begins here is never closed' }
}

/** The end of a number. */
export const endOfNumber = (text: string, from: number): number | SyntaxFault => {
  number.lastIndex = from
  const plain = number.exec(text)?.[0]
  loose.lastIndex = from
  const written = loose.exec(text)?.[0] ?? text.charAt(from)
  if (plain !== undefined && plain.length === written.length) return from + plain.length
  return {
    at: from,
    message: `"${visible(written)}" is not a number of JSON; write it with digits on both sides of a point, without a leading zero or plus`,
  }
}

/** The end of true, false or null; any other character is told what it may have been meant as. */
export const endOfWord = (text: string, from: number): number | SyntaxFault => {
  for (const word of words) if (text.startsWith(word, from)) return from + word.length
  return { at: from, message: strange(text, from) }
}

/** What is wrong with a character where a value is due. */
export const strange = (text: string, at: number): string => {
  const c = text.charAt(at)
  if (c === '') return 'the file ends before it is complete'
  if (text.startsWith('//', at) || text.startsWith('/*', at))
    return 'comments are not part of JSON; remove them'
  if (c === "'" || c === '‘' || c === '’' || c === '“' || c === '”')
    return 'text is put in straight double quotation marks (")'
  name.lastIndex = at
  const word = name.exec(text)?.[0]
  if (word === 'NaN' || word === 'Infinity') return `${word} is not a number of JSON; only finite numbers are`
  if (word !== undefined)
    return `"${visible(word)}" is not a value of JSON; put text in double quotation marks`
  return `"${visible(c)}" cannot stand here`
}

const fourHex = /^[0-9a-fA-F]{4}$/
const escapes = '"\\/bfnrtu'
const words = ['true', 'false', 'null']
const number = /-?(?:0|[1-9][0-9]*)(?:\.[0-9]+)?(?:[eE][+-]?[0-9]+)?/y
const loose = /[-+0-9.eE_]+[a-zA-Z0-9_.]*/y
const name = /[\p{L}_$][\p{L}\p{N}_$]*/uy
