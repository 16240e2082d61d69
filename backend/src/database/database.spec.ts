import { afterAll, beforeAll, describe, expect, it } from '@jest/globals';
import { startTestServer, type TestServer } from '../testing/test-server';
import { createDataSource } from './data-source';
import { TABLE_GRANTS } from './grants';
import { driverErrno, managerOf } from './transactions';

let server: TestServer;

beforeAll(async () => {
  server = await startTestServer();
}, 60_000);

afterAll(() => server.close());

describe('migrations', () => {
  it('build exactly what the entities describe', async () => {
    const owner = createDataSource(server.config.ownerAccount, 1);
    await owner.initialize();
    const drift = await owner.driver.createSchemaBuilder().log();
    await owner.destroy();
    expect(drift.upQueries.map((query) => query.query)).toEqual([]);
  });
});

describe('grants of the application’s account', () => {
  it('are decided for every table', async () => {
    const tables = await server.sql<{ name: string }>(
      'SELECT table_name AS name FROM information_schema.tables WHERE table_schema = ?',
      [server.config.DATABASE_NAME],
    );
    expect(tables.map((table) => table.name).sort()).toEqual(Object.keys(TABLE_GRANTS).sort());
  });

  it.each(Object.entries(TABLE_GRANTS))('hold for %s: %s', async (table, kind) => {
    const rights = await server.sql<{ right: string }>(
      `SELECT privilege_type AS \`right\` FROM information_schema.table_privileges
        WHERE table_schema = ? AND table_name = ? AND grantee = ?`,
      [server.config.DATABASE_NAME, table, `'${server.config.DATABASE_APP_USER}'@'127.0.0.1'`],
    );
    const expected = {
      none: [],
      appendOnly: ['INSERT', 'SELECT'],
      changeable: ['INSERT', 'SELECT', 'UPDATE'],
      disposable: ['DELETE', 'INSERT', 'SELECT', 'UPDATE'],
    }[kind];
    expect(rights.map((row) => row.right).sort()).toEqual(expected);
  });

  it.each(['entry', 'review', 'audit', 'acceptance', 'step_list', 'template_version', 'refrigerant_table'])(
    'let nobody change or delete a row of %s',
    async (table) => {
      for (const statement of [`DELETE FROM ${table}`, `UPDATE ${table} SET company_id = company_id`]) {
        // 1142: ER_TABLEACCESS_DENIED_ERROR
        await expect(server.dataSource.query(statement)).rejects.toMatchObject({ errno: 1142 });
      }
    },
  );
});

describe('a transaction', () => {
  it('is tried again after a deadlock, and both come through', async () => {
    const { transactions } = server.services;
    await server.sql(`INSERT INTO company (id, name, created_at) VALUES
      ('00000000-0000-7000-8000-00000000000a', 'a', NOW(3)), ('00000000-0000-7000-8000-00000000000b', 'b', NOW(3))`);
    let tries = 0;
    const cross = (first: string, second: string): Promise<void> =>
      transactions.run(async (context) => {
        tries += 1;
        const lock = (id: string) =>
          managerOf(context).query(`UPDATE company SET name = CONCAT(name, '!') WHERE id = ?`, [
            `00000000-0000-7000-8000-00000000000${id}`,
          ]);
        await lock(first);
        await new Promise((resolve) => setTimeout(resolve, 80));
        await lock(second);
      });
    await Promise.all([cross('a', 'b'), cross('b', 'a')]);
    const names = await server.sql<{ name: string }>(
      'SELECT name FROM company WHERE name LIKE ? ORDER BY name',
      ['%!'],
    );
    expect(names.map((row) => row.name)).toEqual(['a!!', 'b!!']);
    expect(tries).toBeGreaterThan(2);
  });

  it('leaves nothing behind when its work fails', async () => {
    const { transactions } = server.services;
    const work = transactions.run(async (context) => {
      await managerOf(context).query(`UPDATE company SET name = 'lost'`);
      throw new TypeError('stop');
    });
    await expect(work).rejects.toThrow('stop');
    expect(await server.sql(`SELECT id FROM company WHERE name = 'lost'`)).toEqual([]);
  });

  it('knows the driver’s error numbers behind the ORM’s errors', async () => {
    const failed = await server.dataSource
      .query('SELECT * FROM no_such_table')
      .catch((error: unknown) => error);
    expect([1146, 1142]).toContain(driverErrno(failed));
  });
});
