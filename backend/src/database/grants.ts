import type { DataSource } from 'typeorm';
import { Bug } from '#shared/failures/failure';

const RIGHTS = {
  /** Records: what was written stays as it was written. */
  appendOnly: 'SELECT, INSERT',
  changeable: 'SELECT, INSERT, UPDATE',
  /** Housekeeping tables whose rows come and go. */
  disposable: 'SELECT, INSERT, UPDATE, DELETE',
  none: null,
} as const;

/** What the application's account may do to each table. A table that isn't here fails the migration, and a spec. */
export const TABLE_GRANTS: Readonly<Record<string, keyof typeof RIGHTS>> = {
  company: 'changeable',
  person: 'changeable',
  membership: 'changeable',
  device: 'changeable',
  opening: 'changeable',
  plant_system: 'changeable',
  suction_group: 'changeable',
  circuit: 'changeable',
  fixture: 'changeable',
  coil: 'changeable',
  template_version: 'appendOnly',
  refrigerant_table: 'appendOnly',
  step_list: 'appendOnly',
  sequence: 'changeable',
  entry: 'appendOnly',
  photo: 'changeable',
  review: 'appendOnly',
  audit: 'appendOnly',
  acceptance: 'appendOnly',
  defrost_plan: 'appendOnly',
  handover_package: 'changeable',
  job: 'disposable',
  live_event: 'disposable',
  session: 'disposable',
  sign_in_limit: 'disposable',
  migrations: 'none',
};

/**
 * Gives the application's account exactly the rights listed, table by table. Run by the owner after the migrations.
 *
 * @throws {Bug} for a table without a line in the list, so that nobody forgets to decide
 */
export async function grantTables(
  owner: DataSource,
  database: string,
  appUser: string,
  appHost: string,
): Promise<void> {
  const tables: { name: string }[] = await owner.query(
    'SELECT table_name AS name FROM information_schema.tables WHERE table_schema = ?',
    [database],
  );
  const account = `'${quoted(appUser)}'@'${quoted(appHost)}'`;
  for (const { name } of tables) {
    const kind = TABLE_GRANTS[name];
    if (!kind) throw new Bug(`Table ${name} has no line in TABLE_GRANTS`);
    const rights = RIGHTS[kind];
    if (rights) await owner.query(`GRANT ${rights} ON \`${database}\`.\`${name}\` TO ${account}`);
  }
}

function quoted(name: string): string {
  if (!/^[\w.%-]+$/.test(name)) throw new Bug(`Not an account name: ${name}`);
  return name;
}
