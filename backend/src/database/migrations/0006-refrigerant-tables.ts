import type { MigrationInterface, QueryRunner } from 'typeorm';

/** Makers' pressure–temperature tables of a company: rows are only added, the newest of a designation is in use. */
const TABLE = `CREATE TABLE \`refrigerant_table\` (
    \`id\` uuid NOT NULL,
    \`company_id\` uuid NOT NULL,
    \`designation_key\` varchar(24) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`designation\` varchar(24) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`issuer\` varchar(120) NOT NULL,
    \`edition\` varchar(120) NOT NULL,
    \`printed_step_pa\` double NOT NULL,
    \`safety_class\` varchar(4) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`points\` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL,
    \`created_by\` uuid NOT NULL,
    \`created_at\` datetime(3) NOT NULL,
    INDEX \`IX_refrigerant_table_company\` (\`company_id\`, \`created_at\`),
    PRIMARY KEY (\`id\`)
  ) ENGINE=InnoDB`;

export class RefrigerantTables1764576000006 implements MigrationInterface {
  name = 'RefrigerantTables1764576000006';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(TABLE);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('DROP TABLE `refrigerant_table`');
  }
}
