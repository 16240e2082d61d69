import type { MigrationInterface, QueryRunner } from 'typeorm';

const TABLE = `CREATE TABLE \`defrost_plan\` (
    \`id\` uuid NOT NULL,
    \`company_id\` uuid NOT NULL,
    \`opening_id\` uuid NOT NULL,
    \`version\` int NOT NULL,
    \`rules\` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL,
    \`details\` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL,
    \`circuits\` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL,
    \`plan\` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL,
    \`findings\` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL,
    \`created_by\` uuid NOT NULL,
    \`created_at\` datetime(3) NOT NULL,
    UNIQUE INDEX \`UQ_defrost_plan_version\` (\`opening_id\`, \`version\`),
    PRIMARY KEY (\`id\`)
  ) ENGINE=InnoDB`;

/** Every version of an opening's defrost plan, side by side. */
export class DefrostPlans1764576000007 implements MigrationInterface {
  name = 'DefrostPlans1764576000007';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(TABLE);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('DROP TABLE `defrost_plan`');
  }
}
