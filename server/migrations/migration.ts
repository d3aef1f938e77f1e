export interface MigrationContext {
  /** Runs SQL within the transaction of all migrations; several statements at once where there are no values. */
  run(sql: string, values?: unknown[]): Promise<void>;
}

export interface Migration {
  name: string;
  up(context: MigrationContext): Promise<void>;
}
