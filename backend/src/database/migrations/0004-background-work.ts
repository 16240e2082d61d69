import type { MigrationInterface, QueryRunner } from 'typeorm';

const TABLES = [
  `CREATE TABLE \`job\` (
    \`id\` uuid NOT NULL,
    \`company_id\` uuid NOT NULL,
    \`kind\` varchar(32) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`unique_key\` varchar(160) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`payload\` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL,
    \`state\` varchar(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`attempts\` int NOT NULL,
    \`progress\` double NOT NULL,
    \`created_at\` datetime(3) NOT NULL,
    \`run_after\` datetime(3) NOT NULL,
    \`lease_until\` datetime(3) NULL,
    \`last_error\` varchar(1000) NULL,
    INDEX \`IX_job_due\` (\`kind\`, \`state\`, \`run_after\`),
    UNIQUE INDEX \`UQ_job_key\` (\`unique_key\`),
    PRIMARY KEY (\`id\`)
  ) ENGINE=InnoDB`,
  `CREATE TABLE \`live_event\` (
    \`id\` uuid NOT NULL,
    \`company_id\` uuid NOT NULL,
    \`opening_id\` uuid NOT NULL,
    \`content\` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL,
    \`created_at\` datetime(3) NOT NULL,
    INDEX \`IX_live_event_time\` (\`created_at\`),
    PRIMARY KEY (\`id\`)
  ) ENGINE=InnoDB`,
  `CREATE TABLE \`handover_package\` (
    \`id\` uuid NOT NULL,
    \`company_id\` uuid NOT NULL,
    \`opening_id\` uuid NOT NULL,
    \`version\` int NOT NULL,
    \`language\` varchar(8) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`state\` varchar(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`progress\` double NOT NULL,
    \`heads\` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL,
    \`circuits_approved\` int NOT NULL,
    \`circuits_total\` int NOT NULL,
    \`created_by\` uuid NOT NULL,
    \`created_at\` datetime(3) NOT NULL,
    \`issued_at\` datetime(3) NULL,
    \`pages\` int NULL,
    \`bytes\` int NULL,
    \`sha256\` char(64) CHARACTER SET ascii COLLATE ascii_bin NULL,
    \`installation_signature\` varchar(128) CHARACTER SET ascii COLLATE ascii_bin NULL,
    \`failure\` varchar(500) NULL,
    UNIQUE INDEX \`UQ_handover_package_version\` (\`opening_id\`, \`version\`),
    PRIMARY KEY (\`id\`)
  ) ENGINE=InnoDB`,
  `CREATE TABLE \`acceptance\` (
    \`id\` uuid NOT NULL,
    \`company_id\` uuid NOT NULL,
    \`package_id\` uuid NOT NULL,
    \`person_id\` uuid NOT NULL,
    \`sha256\` char(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`statement\` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL,
    \`installation_signature\` varchar(128) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`created_at\` datetime(3) NOT NULL,
    UNIQUE INDEX \`UQ_acceptance_package\` (\`package_id\`),
    PRIMARY KEY (\`id\`)
  ) ENGINE=InnoDB`,
];

export class BackgroundWork1764576000004 implements MigrationInterface {
  name = 'BackgroundWork1764576000004';

  async up(runner: QueryRunner): Promise<void> {
    for (const table of TABLES) await runner.query(table);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('DROP TABLE `acceptance`');
    await runner.query('DROP TABLE `handover_package`');
    await runner.query('DROP TABLE `live_event`');
    await runner.query('DROP TABLE `job`');
  }
}
