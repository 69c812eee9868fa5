/** Amperage: how far it may change isn't confirmed. */
import { unconfirmedSetting } from '../figures-read.ts'

export const amperage = unconfirmedSetting('current', 'amperage', 'amperage', 'current')
