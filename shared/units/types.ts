/** Dimensions in use and the unit in which each is stored ("SI" here means the trade's metric working units). */
export const SI_UNIT = {
  length: 'mm',
  temperature: '°C',
  temperatureDifference: 'K',
  travelSpeed: 'mm/min',
  wireFeed: 'm/min',
  current: 'A',
  voltage: 'V',
  heatInput: 'kJ/mm',
  stress: 'MPa',
  force: 'kN',
  energy: 'J',
  gasFlow: 'L/min',
  time: 'min',
  duration: 's',
  angle: '°',
  percent: '%',
  frequency: 'Hz',
  pulseTime: 'ms',
  mass: 'kg',
  area: 'mm²',
  hardness: 'HV',
  temperatureRate: 'K/h',
} as const

export type Dimension = keyof typeof SI_UNIT
/** The system in which a record is written and judged; a standard's two printed sets of figures are never mixed. */
export type UnitSystem = 'SI' | 'US'
