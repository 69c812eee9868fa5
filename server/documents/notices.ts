/** Printed at the foot of every page. */
export const CAUTION = 'Arc rays, fume, heat, noise and electric shock can injure or kill: ventilate, protect yourself, follow the safety data sheets.'
export const UNCONTROLLED = 'A printed copy is not kept up to date: check number, revision and status before you weld.'
