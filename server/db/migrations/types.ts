import type { QueryInterface, Transaction } from 'sequelize'

/** What a migration step is handed: always inside one transaction, run by the owner role. */
export interface MigrationStep {
  query: QueryInterface
  transaction: Transaction
}

/** One purpose, forward and back. The name is the file's, and orders it. */
export interface Migration {
  name: string
  up: (step: MigrationStep) => Promise<void>
  down: (step: MigrationStep) => Promise<void>
}
