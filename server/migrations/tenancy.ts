import type { QueryInterface, Transaction } from 'sequelize'
import { RUNTIME_ROLE } from '../config/database.ts'

export interface MigrationContext { query: QueryInterface['sequelize']['query']; queryInterface: QueryInterface; transaction: Transaction }
export interface Migration { up: (context: MigrationContext) => Promise<void> }

/**
 * SQL that closes a table to all but the organization named in the transaction's `app.organization_id`.
 * Without that setting no row is seen and none can be written, so a forgotten scope fails closed.
 */
export const protect = (table: string, grants = 'select, insert, update, delete'): string => `
  alter table ${table} enable row level security;
  create policy tenant on ${table} to ${RUNTIME_ROLE}
    using (organization_id = nullif(current_setting('app.organization_id', true), '')::uuid)
    with check (organization_id = nullif(current_setting('app.organization_id', true), '')::uuid);
  grant ${grants} on ${table} to ${RUNTIME_ROLE};`
