import { m001 } from './001-people.ts'
import { m002 } from './002-records.ts'
import { m003 } from './003-workbench.ts'
import type { Migration } from './tenancy.ts'

/** Every migration in the order in which it runs. A migration that has left this repository is never edited: add the next. */
export const migrations: Readonly<Record<string, Migration>> = {
  '001-people': m001,
  '002-records': m002,
  '003-workbench': m003,
}
