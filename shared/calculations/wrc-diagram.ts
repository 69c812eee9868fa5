/**
 * The WRC-1992 diagram as far as its figures are known: axes, iso-ferrite lines 2 to 100, the curve of FN 0 and the borders of the
 * solidification modes. Points are [Cr equivalent, Ni equivalent] in mass per cent.
 * Digitised from figure 6 of the 1992 paper by an open teaching repository of a university, rounded to 0.01 (secondary).
 */
export type DiagramPoint = readonly [crEq: number, niEq: number]

export const WRC_AXES = { crEq: [17, 31], niEq: [9, 18] } as const

/** Straight between two ends, by rising ferrite number. */
export const FERRITE_LINES: readonly { fn: number; low: DiagramPoint; high: DiagramPoint }[] = [
  { fn: 2, low: [17.04, 10.9], high: [22.15, 17.08] },
  { fn: 4, low: [17.04, 9.94], high: [23.07, 17.05] },
  { fn: 6, low: [17.04, 9.52], high: [23.64, 17.01] },
  { fn: 8, low: [17.1, 9.06], high: [24.31, 17.01] },
  { fn: 10, low: [17.52, 9.05], high: [24.93, 17.06] },
  { fn: 12, low: [18.05, 9.05], high: [25.39, 17.03] },
  { fn: 14, low: [18.33, 9.05], high: [25.88, 17.02] },
  { fn: 16, low: [18.66, 9.05], high: [26.32, 17.04] },
  { fn: 18, low: [19.04, 9.05], high: [26.57, 16.91] },
  { fn: 20, low: [19.42, 9.05], high: [26.78, 16.75] },
  { fn: 22, low: [19.75, 9.05], high: [27.07, 16.59] },
  { fn: 24, low: [20.07, 9.05], high: [27.3, 16.37] },
  { fn: 26, low: [20.32, 9.05], high: [27.48, 16.19] },
  { fn: 28, low: [20.58, 9.05], high: [27.74, 16.01] },
  { fn: 30, low: [20.85, 9.05], high: [27.87, 15.88] },
  { fn: 35, low: [21.19, 9.05], high: [28.2, 15.72] },
  { fn: 40, low: [21.42, 9.05], high: [28.43, 15.39] },
  { fn: 45, low: [21.63, 9.05], high: [28.65, 15.15] },
  { fn: 50, low: [21.84, 9.05], high: [28.95, 14.86] },
  { fn: 55, low: [22.11, 9.05], high: [29.13, 14.65] },
  { fn: 60, low: [22.42, 9.05], high: [29.34, 14.4] },
  { fn: 65, low: [22.72, 9.06], high: [29.53, 14.13] },
  { fn: 70, low: [22.95, 9.06], high: [29.74, 13.81] },
  { fn: 75, low: [23.2, 9.06], high: [30.0, 13.5] },
  { fn: 80, low: [23.47, 9.06], high: [30.15, 13.25] },
  { fn: 85, low: [23.79, 9.06], high: [30.3, 12.98] },
  { fn: 90, low: [24.16, 9.05], high: [30.47, 12.63] },
  { fn: 95, low: [24.47, 9.05], high: [30.61, 12.25] },
  { fn: 100, low: [24.89, 9.05], high: [30.7, 11.8] },
]

/** Left of it the weld metal holds no ferrite. */
export const ZERO_FERRITE: readonly DiagramPoint[] = [[17.23, 12.47], [17.6, 12.94], [18.08, 13.54], [18.57, 14.15], [19.23, 14.95], [19.61, 15.41], [20.12, 16.05], [20.52, 16.55], [21.17, 17.36], [21.53, 17.74]]

/** Between solidification as austenite with ferrite (AF) and as ferrite with austenite (FA). */
export const AF_FA_BORDER: readonly DiagramPoint[] = [[17.15, 12.0], [20.24, 14.3], [22.48, 16.06], [24.6, 17.74]]
/** Between FA and solidification as ferrite (F). */
export const FA_F_BORDER: readonly DiagramPoint[] = [[17.18, 9.48], [20.18, 11.66], [23.18, 13.85], [25.18, 15.32]]
