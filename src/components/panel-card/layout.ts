import type { PanelLine } from '@shared/schemas/machines.ts'

const share = (value: number, { scaleMin, scaleMax }: Pick<PanelLine, 'scaleMin' | 'scaleMax'>): number => Math.max(0, Math.min(1, (value - scaleMin) / (scaleMax - scaleMin)))

/** Where on the scale, 0 to 1, the window lies and the figure to dial stands; null without a window. */
export function barOf(line: Pick<PanelLine, 'min' | 'max' | 'value' | 'scaleMin' | 'scaleMax'>): { from: number; to: number; at: number } | null {
  if (line.min === null || line.max === null || line.value === null) return null
  return { from: share(line.min, line), to: share(line.max, line), at: share(line.value, line) }
}

/** Decimals in which a control's figures are written. */
const decimals = ({ step, text }: Pick<PanelLine, 'step' | 'text'>): number => (step === null ? 0 : (/^-?\d+\.(\d+)/.exec(text)?.[1]?.length ?? 0))

/** A figure of the control as it stands on the panel. */
export const figureOf = (value: number, line: Pick<PanelLine, 'step' | 'text'>): string => (line.step === null ? String(value) : value.toFixed(decimals(line)))

/** The room left around the figure: "320 to 350", or "only this" where there is none. */
export function roomOf(line: PanelLine): string {
  if (line.min === null || line.max === null) return ''
  return line.min === line.max ? 'only this' : `${figureOf(line.min, line)} to ${figureOf(line.max, line)}`
}

/** Where the room's words stand under the bar, per cent: below the window, clear of the ends of the scale. */
export const roomAt = ({ from, to }: { from: number; to: number }): number => Math.max(26, Math.min(74, ((from + to) / 2) * 100))

/** The bar in words, for readers. */
export function barWords(line: PanelLine): string {
  const unit = line.unit === '' ? '' : ` ${line.unit}`
  return `${line.label}: dial ${line.text}; room from ${figureOf(line.min ?? 0, line)} to ${figureOf(line.max ?? 0, line)}${unit}, on a scale from ${line.scaleMin} to ${line.scaleMax}${unit}`
}
