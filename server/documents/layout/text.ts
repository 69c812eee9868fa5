import { CAP_HEIGHT, printable, type Face, type Faces, type Run } from './fonts.ts'

export interface Style { face: Face; size: number; colour: string; leading?: number; tracking?: number; tabular?: boolean }
export interface Line { runs: Run[]; width: number }

export const leadingOf = (style: Style): number => style.leading ?? style.size * 1.32

/** Breaks are allowed after a space, and after these inside a long word. */
const pieces = (word: string): string[] => word.split(/(?<=[/,;·+@_-])(?=.)/u)

function lineOf(faces: Faces, style: Style, text: string): Line {
  const runs = faces.runs(style.face, text, style.tabular)
  return { runs, width: runs.reduce((sum, run) => sum + run.width * style.size + (style.tracking ?? 0) * run.text.length, 0) }
}

export const widthOf = (faces: Faces, style: Style, text: string): number => lineOf(faces, style, printable(text)).width

/** A word wider than the column, cut where it must be. */
function chop(faces: Faces, style: Style, word: string, width: number): string[] {
  const parts: string[] = []
  let part = ''
  for (const character of word) {
    if (part && lineOf(faces, style, part + character).width > width) {
      parts.push(part)
      part = character
    } else part += character
  }
  return [...parts, part]
}

/**
 * Text set in a column: lines that are never wider than `width` (points).
 * A newline starts a line; a word that doesn't fit is broken after a hyphen or slash, else between letters.
 */
export function setText(faces: Faces, style: Style, text: string, width: number): Line[] {
  const lines: Line[] = []
  for (const paragraph of printable(text).split('\n')) {
    let current = ''
    const fits = (candidate: string) => lineOf(faces, style, candidate).width <= width + 0.01
    const flush = () => {
      lines.push(lineOf(faces, style, current))
      current = ''
    }
    for (const word of paragraph.split(' ').filter((part) => part.length > 0)) {
      const joined = current ? `${current} ${word}` : word
      if (fits(joined)) {
        current = joined
        continue
      }
      if (current && fits(word)) {
        flush()
        current = word
        continue
      }
      let glue = current ? ' ' : ''
      for (const piece of pieces(word)) {
        if (fits(current + glue + piece)) current += glue + piece
        else {
          if (current) flush()
          const chopped = chop(faces, style, piece, width)
          for (const part of chopped.slice(0, -1)) {
            current = part
            flush()
          }
          current = chopped.at(-1) ?? ''
        }
        glue = ''
      }
    }
    flush()
  }
  return lines
}

export const heightOf = (lines: readonly Line[], style: Style): number => lines.length * leadingOf(style)

/** Draws lines from the top edge y; the capitals stand in the middle of their leading. */
export function drawLines(faces: Faces, style: Style, lines: readonly Line[], x: number, y: number, width?: number, align: 'left' | 'right' | 'center' = 'left'): void {
  const leading = leadingOf(style)
  const drop = (leading + CAP_HEIGHT[style.face] * style.size) / 2
  lines.forEach((line, index) => {
    const slack = (width ?? line.width) - line.width
    const at = align === 'left' ? x : align === 'right' ? x + slack : x + slack / 2
    faces.draw(line.runs, at, y + index * leading + drop, style.size, style.colour, style.tracking ?? 0)
  })
}
