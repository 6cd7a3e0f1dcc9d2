/**
 * Splits a byte stream into lines without ever holding more than one line and one chunk, whatever the chunks
 * and the lines look like. Bytes, not text: a wrong byte in one line must not disturb the next.
 */

/** A line without its line end, or the news that it was longer than allowed. */
export type Line = Buffer | 'too-long'

/** Takes chunks, gives lines. */
export interface LineSplitter {
  /** The lines that this chunk completes. */
  push(chunk: Buffer): Generator<Line>
  /** The last line, where it had no line end. */
  end(): Generator<Line>
}

const lineFeed = 0x0a
const carriageReturn = 0x0d

const withoutReturn = (line: Buffer): Buffer =>
  line.at(-1) === carriageReturn ? line.subarray(0, line.length - 1) : line

/**
 * Makes a splitter at LF or CRLF. Of a line longer than `longest` bytes nothing is kept.
 *
 * Shapes   every line feed ends one line, empty ones included; bytes after the last line feed are a line too.
 */
export const lineSplitter = (longest: number): LineSplitter => {
  let pieces: Buffer[] = []
  let held = 0
  let tooLong = false

  const keep = (piece: Buffer): void => {
    if (tooLong || held + piece.length > longest) {
      tooLong = true
      pieces = []
      held = 0
    } else if (piece.length > 0) {
      pieces.push(piece)
      held += piece.length
    }
  }

  const take = (): Line => {
    const line = tooLong
      ? 'too-long'
      : withoutReturn(pieces.length === 1 && pieces[0] ? pieces[0] : Buffer.concat(pieces))
    pieces = []
    held = 0
    tooLong = false
    return line
  }

  return {
    *push(chunk) {
      let from = 0
      for (let at = chunk.indexOf(lineFeed); at !== -1; at = chunk.indexOf(lineFeed, from)) {
        keep(chunk.subarray(from, at))
        yield take()
        from = at + 1
      }
      keep(chunk.subarray(from))
    },
    *end() {
      if (held > 0 || tooLong) yield take()
    },
  }
}
