/** Brings a database to the present schema; the address is that of the role proofplate_migrator. */
export declare function migrateAll(migratorUrl: string): Promise<void>;
