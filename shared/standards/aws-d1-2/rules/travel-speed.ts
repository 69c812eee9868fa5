/** Travel speed: how far it may change isn't confirmed. */
import { unconfirmedSetting } from '../figures-read.ts'

export const travelSpeed = unconfirmedSetting('travelSpeed', 'travel-speed', 'travel speed', 'travelSpeed')
