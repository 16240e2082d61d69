import { createDataSource, type DatabaseAccount } from './data-source';
import { grantTables } from './grants';

/** Brings the database up to date with the owner's account, and gives the application's account its rights. */
export async function migrate(owner: DatabaseAccount, appUser: string, appHost: string): Promise<void> {
  const source = createDataSource(owner, 1);
  await source.initialize();
  try {
    await source.runMigrations();
    await grantTables(source, owner.database, appUser, appHost);
  } finally {
    await source.destroy();
  }
}
