/** Voltage: how far it may change isn't confirmed. */
import { unconfirmedSetting } from '../figures-read.ts'

export const voltage = unconfirmedSetting('voltage', 'voltage', 'voltage', 'voltage')
