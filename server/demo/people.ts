/** The demo firm and its people; all invented. */
import type { Role } from '@shared/schemas/people.ts'

export const FIRM = { id: '1a2c9f60-5b7e-4d0a-9c31-6f0e5d1b7a01', name: 'Larkfield Fabrication', address: 'Unit 4, Weir Lane Works, Larkfield', defaultUnitSystem: 'SI' } as const

/** Printed at start-up for everybody to see: it opens invented records and nothing else. */
export const DEMO_PASSWORD = 'larkfield weir lane 4'

export const PEOPLE = {
  ines: { name: 'Ines Callard', email: 'ines@larkfield.example', roles: ['engineer'] },
  tobias: { name: 'Tobias Renwick', email: 'tobias@larkfield.example', roles: ['engineer'] },
  hal: { name: 'Hal Ostby', email: 'hal@larkfield.example', roles: ['inspector'] },
  marit: { name: 'Marit Vance', email: 'marit@larkfield.example', roles: ['supervisor'] },
  joe: { name: 'Joe Pell', email: 'joe@larkfield.example', roles: ['welder'] },
  anya: { name: 'Anya Brook', email: 'anya@larkfield.example', roles: ['welder'] },
  rosa: { name: 'Rosa Madderly', email: 'rosa@larkfield.example', roles: ['administrator'] },
  priya: { name: 'Priya Solway', email: 'priya@larkfield.example', roles: ['auditor'] },
  sam: { name: 'Sam Ferrow', email: 'sam@larkfield.example', roles: ['inspector', 'supervisor'] },
} as const satisfies Record<string, { name: string; email: string; roles: readonly Role[] }>
export type PersonKey = keyof typeof PEOPLE

export interface DemoSignIn { role: string; email: string; password: string }

/** One line a person, the first of each role being that role's own; for the screen at start-up and for tests. */
export const demoSignIns: readonly DemoSignIn[] = Object.values(PEOPLE).map(({ email, roles }) => ({ role: roles.join(' and '), email, password: DEMO_PASSWORD }))
