/**
 * Reads a joint as the trade writes it in one line: `12 mm A516-70 to A516-70 SMAW 3G`, `304L pipe 2in sch 40 GTAW 6G`,
 * `PF 135 S355 t10`. Every part that was understood is told back in words; what was not is listed, never dropped.
 */
import { baseMetalById, baseMetalTitle } from '../library/base-metals.ts'
import { asmePositions, isoMainPositions } from '../library/positions.ts'
import { readProcess } from '../library/processes.ts'
import type { Interval } from '../schemas/common.ts'
import { POSITIONS, type Position, type Process } from '../schemas/welding.ts'
import { interval } from '../units/convert.ts'
import { formatInterval } from '../units/format.ts'
import { parseInterval } from '../units/parse.ts'
import { plainSigns } from '../units/read-number.ts'
import type { UnitSystem } from '../units/types.ts'
import { askedMetal, emptyQuestion, type AskedMetal, type JointQuestion } from './joint-question.ts'
import { PIPE_SOURCE, pipeSize } from './pipe-sizes.ts'

export interface JointReading extends JointQuestion {
  /** How the line was read, part by part. */
  read: { label: string; value: string }[]
  /** Words that were not understood. */
  notRead: string[]
}

/** What of the line is still unread; taking a match leaves a gap so that words on either side don't join. */
class Rest {
  text: string
  constructor(text: string) {
    this.text = text
  }
  /** Takes the first match out of the line; `accept` may refuse it and leave it there. */
  take<T>(pattern: RegExp, accept: (match: RegExpExecArray) => T | null): T | null {
    const match = pattern.exec(this.text)
    if (!match) return null
    const result = accept(match)
    if (result !== null) this.text = `${this.text.slice(0, match.index)} | ${this.text.slice(match.index + match[0].length)}`
    return result
  }
}

/** The whole part of a mixed number has one figure here, so that `6061 1/4 in` and `Gr 70 3/8"` are an alloy and a fraction. */
const NUMBER = String.raw`(?:(?<![\w.])(?<!\b(?:no|nr|number|gr|grade|type|cl|class)\.?\s*)\d[ -]\d+\/\d+|\d+\/\d+|\d*[.,]?\d+)`
const LENGTH_UNIT = String.raw`(?:mm|cm|inch(?:es)?|in\b\.?|")`
const SIZE = new RegExp(String.raw`(?:\bnps\s*)?(${NUMBER})\s*(?:in\b\.?|inch|")?[\s|]*(?:nps\s*)?,?\s*\bsch(?:edule)?\.?\s*(\d+)(s)?\b`, 'i')
const NPS = new RegExp(String.raw`\bnps\s*(${NUMBER})`, 'i')
const DIAMETER_BY_WALL = new RegExp(String.raw`(${NUMBER})\s*(?:${LENGTH_UNIT})?\s*[x×]\s*(${NUMBER})\s*(${LENGTH_UNIT})`, 'i')
const DIAMETER = new RegExp(String.raw`(?:\b(?:od|dia(?:meter)?)\b|[øØ⌀])\.?\s*=?\s*(${NUMBER}\s*(?:${LENGTH_UNIT})?)`, 'i')
const THICKNESS_NAMED = new RegExp(String.raw`\b(?:t|thk|thickness)\s*=?\s*(${NUMBER}(?:\s*(?:-|to)\s*${NUMBER})?\s*(?:${LENGTH_UNIT})?)(?![\w/])`, 'i')
const THICKNESS = new RegExp(String.raw`(?<![\w.-])((?:max\.?|min\.?|up to|[≤≥])?\s*${NUMBER}\s*(?:${LENGTH_UNIT})?\s*(?:(?:-|to)\s*${NUMBER}\s*)?${LENGTH_UNIT})(?![\w/])(?:\s*(?:thick|thk|wall)\b)?`, 'i')

const asInterval = (text: string, system: UnitSystem): Interval | null => {
  const reading = parseInterval(text, 'length', system)
  return reading.ok ? reading.interval : null
}

interface Note { label: string; value: string }

function readSize(rest: Rest, system: UnitSystem, found: JointQuestion, notes: Note[], notRead: string[]): void {
  const pipe = (nps: string, schedule: string | null, stainless: boolean): true | null => {
    const size = pipeSize(nps)
    if (!size) return null
    found.product = 'pipe'
    found.diameter = interval(size.outside, undefined, 'length', 'in')
    notes.push({ label: 'Outside diameter', value: `${formatInterval(found.diameter, 'length', system, { asTyped: false }).text} (NPS ${size.nps}, ${PIPE_SOURCE.standard} from memory: confirm)` })
    if (schedule === null) return true
    // The S schedules are those of stainless pipe; they leave B36.10 above NPS 10 (40S) and NPS 8 (80S).
    const differs = stainless && size.outside > (schedule === '40' ? 10.75 : 8.625)
    const wall = schedule === '40' ? size[40] : schedule === '80' ? size[80] : null
    if (wall === null || differs) notRead.push(`sch ${schedule}${stainless ? 'S' : ''}: wall not known here, write the thickness`)
    else {
      found.thickness = interval(wall, undefined, 'length', 'in')
      notes.push({ label: 'Thickness', value: `${formatInterval(found.thickness, 'length', system, { asTyped: false }).text} (Schedule ${schedule}${stainless ? 'S' : ''}, ${PIPE_SOURCE.standard} from memory: confirm)` })
    }
    return true
  }
  if (!rest.take(SIZE, (match) => pipe(match[1] ?? '', match[2] ?? '', match[3] !== undefined))) rest.take(NPS, (match) => pipe(match[1] ?? '', null, false))
  const shown = (given: Interval): string => formatInterval(given, 'length', system).text
  rest.take(DIAMETER_BY_WALL, ([, first = '', second = '', unit = '']) => {
    const [one, other] = [asInterval(`${first} ${unit}`, system), asInterval(`${second} ${unit}`, system)]
    if (!one || !other) return null
    const [wide, thin] = (one.max?.si ?? 0) > (other.max?.si ?? 0) ? [one, other] : [other, one]
    found.diameter ??= wide
    found.thickness ??= thin
    found.product = 'pipe'
    notes.push({ label: 'Outside diameter', value: shown(wide) }, { label: 'Thickness', value: shown(thin) })
    return true
  })
  rest.take(DIAMETER, ([, text = '']) => {
    const given = asInterval(text, system)
    if (!given || found.diameter) return null
    found.diameter = given
    found.product = 'pipe'
    notes.push({ label: 'Outside diameter', value: shown(given) })
    return true
  })
  for (const pattern of [THICKNESS_NAMED, THICKNESS]) {
    rest.take(pattern, ([, text = '']) => {
      const given = found.thickness ? null : asInterval(text, system)
      if (!given) return null
      found.thickness = given
      notes.push({ label: 'Thickness', value: shown(given) })
      return true
    })
  }
}

function readWords(rest: Rest, found: JointQuestion, notes: Note[]): void {
  rest.take(/\b(fillet|FW)\b/i, () => (found.weld = 'fillet'))
  rest.take(/\b(groove|butt|BW)\b/i, () => (found.weld ??= 'groove'))
  rest.take(/\b(pipe|tube|piping)\b/i, () => (found.product = 'pipe'))
  rest.take(/\b(plate|sheet)\b/i, () => (found.product ??= 'plate'))
  rest.take(/\b(pulsed?|pulsing)\b/i, () => (found.pulsed = true))
  rest.take(/\b(uphill|vertical up|upward|upwards)\b/i, () => (found.progression = 'up'))
  rest.take(/\b(downhill|vertical down|downward|downwards)\b/i, () => (found.progression = 'down'))
  if (found.pulsed) notes.push({ label: 'Current', value: 'pulsed' })
}

const isPosition = (text: string): text is Position => POSITIONS.some((position) => position === text)

function readPosition(rest: Rest, found: JointQuestion, notes: Note[]): void {
  const words = (position: Position): string => (found.progression ? `${position}, ${found.progression}ward` : position)
  const asme = rest.take(/(?<![\w-])([1-6](?:GR|G|F))(?![\w-])/i, ([, text = '']) => (isPosition(text.toUpperCase()) ? (text.toUpperCase() as Position) : null))
  if (asme) {
    found.position = asme
    notes.push({ label: 'Position', value: words(asme) })
    return
  }
  rest.take(/(?<![\w-])(P[A-HJK]|[HJ]-?L0?45)(?![\w-])/i, ([, text = '']) => {
    const symbol = /L0?45/i.test(text) ? `${text[0]?.toUpperCase()}-L045` : text.toUpperCase()
    // PB and PD are fillet positions; the others are asked of a groove unless a fillet is named.
    const weld = found.weld ?? (symbol === 'PB' || symbol === 'PD' ? 'fillet' : 'groove')
    const { positions, progression } = asmePositions(symbol, weld, found.product)
    const position = positions.find((each) => !each.endsWith('R')) ?? positions[0]
    if (!position) return null
    found.position = position
    found.progression ??= progression
    notes.push({ label: 'Position', value: `${symbol}, ${isoMainPositions.find((each) => each.symbol === symbol)?.name ?? ''}: ${words(position)}` })
    return true
  })
}

function readProcesses(rest: Rest, found: JointQuestion, notes: Note[]): void {
  const PROCESS = /(?<![\w.-])([A-Z]{3,4}(?:-[A-Z]{1,2})?|MIG\/MAG|1[1-5]\d)(?![\w.]|-\d|\s*(?:mm|in\b|"))/gi
  const seen: Process[] = []
  for (const match of rest.text.matchAll(PROCESS)) {
    const reading = readProcess(match[0])
    if (!reading || (reading.process === 'OTHER' && !/[A-Z]/i.test(match[0]))) continue
    rest.take(new RegExp(`(?<![\\w.-])${match[0].replace('/', '\\/')}(?![\\w.])`, 'i'), () => true)
    if (!seen.includes(reading.process)) seen.push(reading.process)
    if (reading.transferMode === 'pulsed-spray') found.pulsed = true
    notes.push({ label: 'Process', value: reading.isoNumber ? `${reading.isoNumber}, ${reading.what}: ${reading.process}` : `${reading.process}, ${reading.row.name}` })
  }
  found.processes = seen
  found.process = seen[0] ?? null
}

const CONNECTING = /^(?:to|and|with|on|in|x|\+|-|\/|&|,|;|\|)?$/i
/** A single word that can be a metal by itself: a letter with a figure, an alloy number, a material number. */
const METAL_WORD = /^(?=.*\d)(?=.*[a-z])[\w./-]{2,}$|^\d{3,4}(?:-\w+)?$|^\d\.\d{4}$|^[a-z]{3}$/i

const metalWords = (metal: AskedMetal): string => {
  const row = metal.libraryIds.length === 1 ? baseMetalById(metal.libraryIds[0] ?? '') : null
  const numbers = [metal.pNumber ? `P-No. ${metal.pNumber}${metal.groupNumber ? ` Group ${metal.groupNumber}` : ''}` : metal.libraryIds.some((id) => baseMetalById(id)?.p_no) ? 'P-No. open until the specification is named' : 'P-No. not listed', ...(metal.iso15608 ? [`ISO 15608 group ${metal.iso15608}`] : [])]
  const name = row ? baseMetalTitle(row) : metal.libraryIds.length > 1 ? `${metal.text} (${metal.libraryIds.length} listed forms)` : metal.text
  return metal.libraryIds.length === 0 ? name : `${name}, ${numbers.join(', ')}`
}

function readMetals(rest: Rest, found: JointQuestion, notes: Note[], notRead: string[]): void {
  const words = rest.text.replace(/(?<=[\w)])\s*[/+]\s*(?=(?:S?[AB]-?\d{2,}|\d{3}))/gi, ' | ').split(/\s+/)
  const metals: AskedMetal[] = []
  for (let index = 0; index < words.length; ) {
    const metal = [4, 3, 2, 1].map((count) => ({ count, text: words.slice(index, index + count) })).find(({ count, text }) => text.length === count && !text.some((word) => CONNECTING.test(word)) && (count > 1 ? askedMetal(text.join(' '), found.product) !== null && startsMetal(text) : METAL_WORD.test(text[0] ?? '') && askedMetal(text[0] ?? '', found.product) !== null))
    if (metal && metals.length < 2) {
      const read = askedMetal(metal.text.join(' '), found.product)
      if (read) metals.push(read)
      index += metal.count
      continue
    }
    const word = words[index] ?? ''
    if (!CONNECTING.test(word)) notRead.push(word)
    index += 1
  }
  const [one = null, other = null] = metals
  found.metalA = one
  found.metalB = other ?? one
  if (one) notes.push({ label: 'Base metals', value: other === null || other.text === one.text ? `${metalWords(one)}, to itself` : `${metalWords(one)} to ${metalWords(other)}` })
}

/** Several words are one metal only if they begin as a specification or P-Number does. */
const startsMetal = (text: readonly string[]): boolean => /^(?:S?[AB]-?\d*|ASTM|ASME|EN|API|AW|UNS|Type|Gr\.?|Grade|P-?No\.?|P-?Number|P)$/i.test(text[0] ?? '') || /^S?[AB]-?\d+M?$/i.test(text[0] ?? '')

/**
 * Reads a joint from one line. Bare figures take the system's unit; a line of nothing known gives an empty question.
 */
export function readJointLine(text: string, system: UnitSystem): JointReading {
  const found: JointQuestion = { ...emptyQuestion }
  const [read, notRead]: [Note[], string[]] = [[], []]
  const rest = new Rest(plainSigns(text).trim().slice(0, 400))
  readWords(rest, found, read)
  readSize(rest, system, found, read, notRead)
  readProcesses(rest, found, read)
  readPosition(rest, found, read)
  readMetals(rest, found, read, notRead)
  if (found.position) {
    found.weld ??= /F$/.test(found.position) ? 'fillet' : 'groove'
    if (/^[56]/.test(found.position)) found.product ??= 'pipe'
  }
  if (found.weld) read.push({ label: 'Weld', value: found.weld })
  if (found.product) read.push({ label: 'Product', value: found.product })
  return { ...found, read, notRead: notRead.filter((word) => word !== '') }
}
