/** 8.4.6 current and 8.5: transfer mode, wire system, flux of submerged arc. */
import type { ProcessBlock } from '../../../schemas/welding.ts'
import { sameText } from '../../common/reading.ts'
import { nameBandRule } from '../../common/review-band.ts'
import { levelOf, levelTwoLimit } from '../levels.ts'
import { meta } from '../meta.ts'

const WIRE = new Set(['GMAW', 'FCAW', 'GTAW', 'PAW'])

/** `DCEP`, `AC`, `DCEP pulsed` …; null where type or pulsing isn't stated. */
export function currentName(block: ProcessBlock | null): string | null {
  const type = block?.electrical.currentType
  if (!block || !type) return null
  const { pulsed, transferMode } = block.electrical
  const name = type === 'AC-balanced' ? 'AC' : type
  if (pulsed === true || transferMode === 'pulsed-spray') return `${name} pulsed`
  return pulsed === false || transferMode !== null || !block.process || !WIRE.has(block.process) ? name : null
}

const named = (value: string | null): readonly string[] | null => (value === null ? null : [value])

export const currentType = nameBandRule({
  meta: meta('current-type', { title: 'Type of current and polarity', clause: '8.4.6', basis: 'memory', statement: 'AC, DC and pulsed current and the polarity stay as tested at level 2; for process 111 AC also covers DC of both polarities where impact is not required. Level 1 is believed to bind only with impact.' }),
  field: 'electrical.currentType',
  at: 'block',
  label: 'current type and polarity',
  asked: (context) => named(currentName(context.block)),
  tested: (_context, side) => named(currentName(side.block)),
  covers(value, context, side) {
    const dc = ['DCEP', 'DCEN']
    const alternating = side.block?.process === 'SMAW' && value[0] === 'AC'
    const sure = alternating && context.toughness === false ? [...value, ...dc] : value
    if (levelOf(context) === '1' && context.toughness !== true) return { sure, maybe: 'any', why: 'Level 1 is believed to bind the current only where impact is required, which is not confirmed.' }
    if (levelOf(context) === '1') return { sure }
    return alternating && context.toughness === null ? { sure, maybe: dc, why: 'AC covers DC only where impact is not required, which isn\'t stated.', missing: ['procedure: toughnessRequired'] } : { sure }
  },
  because: 'Type, pulsing and polarity stay as tested.',
  lacks: () => ['electrical.currentType', 'electrical.pulsed'],
})

const TRANSFER: Readonly<Record<string, readonly string[]>> = { 'short-circuiting': ['short-circuiting'], spray: ['spray', 'globular'], globular: ['spray', 'globular'], 'pulsed-spray': ['pulsed-spray'] }

export const transferMode = levelTwoLimit(
  nameBandRule({
    meta: meta('transfer-mode', { title: 'Transfer mode', clause: '8.5', basis: 'memory', processes: ['GMAW'], statement: 'With solid and metal-cored wire short-circuiting covers itself only; spray and globular cover each other. A change to or from pulsed transfer must be looked up.' }),
    field: 'electrical.transferMode',
    at: 'block',
    label: 'transfer mode',
    asked: (context) => named(context.block?.electrical.transferMode ?? null),
    tested: (_context, side) => named(side.block?.electrical.transferMode ?? null),
    covers([value = '']) {
      const sure = TRANSFER[value] ?? [value]
      if (value === 'short-circuiting') return { sure, maybe: ['pulsed-spray'], why: 'How the clause sees a change to or from pulsed transfer is not known here.' }
      return { sure, maybe: value === 'pulsed-spray' ? ['spray', 'globular', 'short-circuiting'] : ['pulsed-spray'], why: 'How the clause sees a change to or from pulsed transfer is not known here.' }
    },
    because: 'Short-circuiting stands alone; spray and globular cover each other.',
    setValue: (name) => name,
  }),
)

const wires = (block: ProcessBlock | null): readonly string[] | null => {
  if (!block) return null
  const byHand = block.mechanisation === 'manual' || block.mechanisation === 'semiautomatic'
  const value = block.technique.electrodes ?? (byHand && block.process !== 'SAW' ? 'single' : null)
  return value && [`${value} wire`]
}

export const wireSystem = levelTwoLimit(
  nameBandRule({
    meta: meta('wire-system', { title: 'Wire system', clause: '8.5', basis: 'memory', processes: ['SAW', 'GMAW', 'FCAW'], statement: 'One wire and several wires do not stand for each other.' }),
    field: 'technique.electrodes',
    at: 'block',
    label: 'wire system',
    asked: (context) => wires(context.block),
    tested: (_context, side) => wires(side.block),
    because: 'Single and multiple wire stay as tested.',
  }),
)

const flux = (block: ProcessBlock | null): readonly string[] | null => (block?.filler.fluxTradeName && block.filler.fluxClassification ? [`${sameText(block.filler.fluxTradeName)} ${sameText(block.filler.fluxClassification)}`] : null)

export const fluxMake = levelTwoLimit(
  nameBandRule({
    meta: meta('flux', { title: 'Flux', clause: '8.5', basis: 'read', processes: ['SAW'], statement: 'The flux of submerged arc welding stays of the make and designation tested.' }),
    field: 'filler.fluxTradeName',
    at: 'block',
    label: 'flux',
    asked: (context) => flux(context.block),
    tested: (_context, side) => flux(side.block),
    because: 'Make and designation stay as tested.',
    lacks: () => ['filler.fluxTradeName', 'filler.fluxClassification'],
  }),
)
