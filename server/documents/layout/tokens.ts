/** The temper colours of steel, as on screen, with tints that still differ when printed in black and white. */
export const COLOUR = {
  ink: '#1B2226',
  soft: '#5C676D',
  rule: '#BDB8AC',
  hair: '#DEDAD1',
  band: '#F5F3EE',
  steel: '#2C4A5E',
  straw: '#B9791A',
  strawWash: '#FBF1DC',
  plum: '#5E4379',
  blue: '#2A5F88',
  bronze: '#B9791A',
  paleStraw: '#DBA544',
  jade: '#1D6F5C',
  jadeWash: '#E3F1EC',
  oxide: '#A8361F',
  oxideWash: '#FAE9E4',
  backing: '#E9E6DC',
  white: '#FFFFFF',
} as const

/** Weld passes run in the order in which heat tints appear. */
export const PASS_COLOURS = [COLOUR.plum, COLOUR.blue, COLOUR.bronze, COLOUR.paleStraw] as const

/** Points in a millimetre. */
export const MM = 72 / 25.4
