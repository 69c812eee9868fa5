/** Welding processes: AWS A3.0 letters beside ISO 4063 numbers. */
import { PROCESSES, TRANSFER_MODES, type Process } from '../schemas/welding.ts'
import data from './data/processes.json' with { type: 'json' }
import { processRowSchema, type ProcessRow } from './rows.ts'

export const processes: readonly ProcessRow[] = data.table.map((row) => processRowSchema.parse(row))
export const processSource: string = data.source

export interface ProcessReading {
  process: Process
  row: ProcessRow
  /** The ISO 4063 number when that is what was written. */
  isoNumber: string | null
  /** What the number or letters say beyond the process, e.g. `active gas, solid wire (MAG)`. */
  what: string
  transferMode: (typeof TRANSFER_MODES)[number] | null
}

const TRANSFER: Readonly<Record<string, (typeof TRANSFER_MODES)[number]>> = { 'GMAW-S': 'short-circuiting', 'GMAW-G': 'globular', 'GMAW-SP': 'spray', 'GMAW-P': 'pulsed-spray' }
const SHOP_NAMES: Readonly<Record<string, string>> = { TIG: 'GTAW', GTA: 'GTAW', MIG: 'GMAW', MAG: 'GMAW', 'MIG/MAG': 'GMAW', MMA: 'SMAW', STICK: 'SMAW', FCAW: 'FCAW-G', 'SUB-ARC': 'SAW', SUBARC: 'SAW' }

/** The process of the record that a row belongs to; processes outside the list are OTHER. */
const recordProcess = (row: ProcessRow): Process => PROCESSES.find((process) => process === row.aws || row.aws.startsWith(`${process}-`)) ?? 'OTHER'

/**
 * Reads a process written as AWS letters (`GMAW-P`), an ISO 4063 number (`135`) or the shop's word (`TIG`).
 * @returns null when it names none
 */
export function readProcess(text: string): ProcessReading | null {
  const written = text.trim().toUpperCase()
  for (const row of processes) {
    const number = row.iso_4063.find(({ no }) => no === written)
    if (number) return { process: recordProcess(row), row, isoNumber: number.no, what: number.what, transferMode: null }
  }
  const letters = SHOP_NAMES[written] ?? written
  const row = processes.find(({ aws, variants }) => aws === letters || variants.some(({ code }) => code === letters))
  if (!row) return null
  const variant = row.variants.find(({ code }) => code === letters)
  return { process: recordProcess(row), row, isoNumber: null, what: variant?.what ?? row.name, transferMode: TRANSFER[letters] ?? null }
}
