/** What headers of loggers and power sources call time, current and voltage, in several languages, and the units beside them. */
import type { ArcLayout } from '../schemas/arc-data.ts'

export type Meaning = 'time' | 'current' | 'voltage'

const WORDS: Record<Meaning, RegExp> = {
  time: /\b(time|zeit|temps|tiempo|tempo|tijd|tid|czas|čas|aika|timestamp|elapsed|sec|seconds?)\b|^t$|时间|時間|время/iu,
  current: /\b(current|strom|stromst[äa]rke|courant|intensit[éea]|intensidad|corriente|corrente|stroom|str[öo]m|pr[ąa]d|proud|virta|amps?|amp[eè]res?|amperage)\b|schwei(ß|ss)strom|^i[ _]?(w|a|arc|weld|ist|act)?$|电流|電流|ток/iu,
  voltage: /\b(voltage|volts?|spannung|tension|tensi[óo]n|tensione|tens[ãa]o|spanning|sp[äa]nning|napi[ęe]cie|nap[ěe]t[íi]|j[äa]nnite)\b|(licht)?bogenspannung|schwei(ß|ss)spannung|^[uv][ _]?(w|a|arc|weld|ist|act)?$|电压|電圧|напряжение/iu,
}
/** What was asked for rather than measured, and what is worked out of several. */
const NOT_MEASURED = /\b(set|setpoint|soll|preset|nominal|reference|ref|target|command|consigne|limit)\b|sollwert/iu
const OTHER = /\b(power|leistung|puissance|energy|energie|heat|gas|flow|feed|wire|draht|speed|motor|temp(erature)?|resistance|status|error|job|program)\b/iu

const TIME_UNITS: readonly (readonly [RegExp, Exclude<ArcLayout['timeUnit'], 'none'>])[] = [
  [/^(µs|μs|us|usec|microseconds?|mikrosekunden?)$/iu, 'µs'],
  [/^(ms|msec|milliseconds?|millisekunden?)$/iu, 'ms'],
  [/^(s|sec|secs|seconds?|sekunden?|secondes?|segundos?)$/iu, 's'],
]
const CURRENT_UNITS: readonly (readonly [RegExp, ArcLayout['currentUnit']])[] = [[/^ma$/i, 'mA'], [/^ka$/i, 'kA'], [/^(a|amps?|amp[eè]res?)$/iu, 'A']]
const VOLTAGE_UNITS: readonly (readonly [RegExp, ArcLayout['voltageUnit']])[] = [[/^mv$/i, 'mV'], [/^kv$/i, 'kV'], [/^(v|volts?)$/i, 'V']]

export interface HeaderReading {
  meaning: Meaning | null
  timeUnit: Exclude<ArcLayout['timeUnit'], 'none'> | null
  currentUnit: ArcLayout['currentUnit'] | null
  voltageUnit: ArcLayout['voltageUnit'] | null
  /** A set value or reference, not a reading. */
  asked: boolean
}

const unitOf = <U>(units: readonly (readonly [RegExp, U])[], text: string): U | null => units.find(([pattern]) => pattern.test(text))?.[1] ?? null

/** What one column's head says, its words and a unit in brackets, after a comma, slash or underscore, or in a line of its own. */
export function readHeader(head: string): HeaderReading {
  const text = head.replace(/["']/g, '').replace(/\s+/g, ' ').trim()
  const bracketed = /[([{<]\s*([^)\]}>]*?)\s*[)\]}>]/u.exec(text)?.[1] ?? null
  const words = text.replace(/[([{<][^)\]}>]*[)\]}>]/gu, ' ').replace(/[_/,.:#-]/g, ' ').replace(/([a-zß])([A-Z])/g, '$1 $2').replace(/\s+/g, ' ').trim()
  const last = words.split(' ').at(-1) ?? ''
  const candidate = bracketed ?? last
  const timeUnit = unitOf(TIME_UNITS, candidate)
  const currentUnit = unitOf(CURRENT_UNITS, candidate)
  const voltageUnit = unitOf(VOLTAGE_UNITS, candidate)
  const bare = bracketed === null && words.includes(' ') ? words.slice(0, words.lastIndexOf(' ')) : words
  const named = (['time', 'current', 'voltage'] as const).find((meaning) => WORDS[meaning].test(words) || WORDS[meaning].test(bare)) ?? null
  const byUnit: Meaning | null = timeUnit !== null && (bracketed !== null || words === last) ? 'time' : currentUnit !== null ? 'current' : voltageUnit !== null ? 'voltage' : null
  // "Motor current" and "voltage of the wire feeder" measure another circuit.
  const other = OTHER.test(words) && !/\b(arc|weld(ing)?|schwei)/iu.test(words)
  return { meaning: other ? null : (named ?? byUnit), timeUnit, currentUnit, voltageUnit, asked: NOT_MEASURED.test(words) }
}
