/** The product's database. */
export const DATABASE_NAME = 'firstcold';

/** The server's own administrator; used by these scripts and by tests. */
export const ROOT_USER = 'root';

/** Owns the product's tables: runs migrations and passes rights on. */
export const OWNER_USER = 'firstcold_owner';

/** The account that the product works with: has exactly what the migrations granted. */
export const APP_USER = 'firstcold_app';

/** Accounts are bound to this address: with --skip-name-resolve, "localhost" over TCP matches nothing. */
const ACCOUNT_HOST = '127.0.0.1';

/**
 * The statements that the server runs before it accepts its first connection. Doing it there leaves no
 * moment at which root has no password, and brings accounts in line with secrets.json at every start.
 * The server reads one statement a line.
 * @param {import('./secrets.mjs').Secrets} secrets
 * @param {{ testDatabases: boolean }} options whether the owner may also own databases called test_…
 * @returns {string}
 */
export function accountStatements(secrets, { testDatabases }) {
  const owner = `'${OWNER_USER}'@'${ACCOUNT_HOST}'`;
  const app = `'${APP_USER}'@'${ACCOUNT_HOST}'`;
  const root = `'${ROOT_USER}'@'${ACCOUNT_HOST}'`;
  const statements = [
    "DELETE FROM mysql.global_priv WHERE User = '' OR (User = 'root' AND Host NOT IN ('localhost', '127.0.0.1'))",
    'FLUSH PRIVILEGES',
    `CREATE USER IF NOT EXISTS ${root}`,
    `ALTER USER ${root} ${identified(secrets.databaseRootPassword)}`,
    `GRANT ALL PRIVILEGES ON *.* TO ${root} WITH GRANT OPTION`,
    `CREATE USER IF NOT EXISTS 'root'@'localhost'`,
    `ALTER USER 'root'@'localhost' ${identified(secrets.databaseRootPassword)}`,
    `CREATE DATABASE IF NOT EXISTS ${DATABASE_NAME} CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_ci`,
    `CREATE USER IF NOT EXISTS ${owner}`,
    `ALTER USER ${owner} ${identified(secrets.databaseOwnerPassword)}`,
    `GRANT ALL PRIVILEGES ON ${DATABASE_NAME}.* TO ${owner} WITH GRANT OPTION`,
    `CREATE USER IF NOT EXISTS ${app}`,
    `ALTER USER ${app} ${identified(secrets.databaseAppPassword)}`,
  ];
  if (testDatabases) {
    statements.push(`GRANT ALL PRIVILEGES ON \`test\\_%\`.* TO ${owner} WITH GRANT OPTION`);
  }
  return statements.map((statement) => `${statement};\n`).join('');
}

/** @param {string} password base64url, so it needs no escaping; anything else is refused */
function identified(password) {
  if (!/^[\w-]+$/.test(password)) {
    throw new TypeError(
      'A database password in secrets.json has characters other than letters, digits, _ and -',
    );
  }
  return `IDENTIFIED BY '${password}'`;
}
