import type { MigrationInterface, QueryRunner } from 'typeorm';

const TABLES = [
  `CREATE TABLE \`company\` (
    \`id\` uuid NOT NULL,
    \`name\` varchar(120) NOT NULL,
    \`created_at\` datetime(3) NOT NULL,
    PRIMARY KEY (\`id\`)
  ) ENGINE=InnoDB`,
  `CREATE TABLE \`person\` (
    \`id\` uuid NOT NULL,
    \`company_id\` uuid NOT NULL,
    \`name\` varchar(120) NOT NULL,
    \`email\` varchar(254) CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL,
    \`password_hash\` varchar(255) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`company_role\` varchar(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`language\` varchar(8) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`is_active\` tinyint NOT NULL,
    \`created_at\` datetime(3) NOT NULL,
    INDEX \`IX_person_company\` (\`company_id\`),
    UNIQUE INDEX \`UQ_person_email\` (\`email\`),
    PRIMARY KEY (\`id\`)
  ) ENGINE=InnoDB`,
  `CREATE TABLE \`membership\` (
    \`id\` uuid NOT NULL,
    \`company_id\` uuid NOT NULL,
    \`opening_id\` uuid NOT NULL,
    \`person_id\` uuid NOT NULL,
    \`role\` varchar(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`created_at\` datetime(3) NOT NULL,
    \`ended_at\` datetime(3) NULL,
    INDEX \`IX_membership_person\` (\`person_id\`),
    UNIQUE INDEX \`UQ_membership_opening_person\` (\`opening_id\`, \`person_id\`),
    PRIMARY KEY (\`id\`)
  ) ENGINE=InnoDB`,
  `CREATE TABLE \`device\` (
    \`id\` uuid NOT NULL,
    \`company_id\` uuid NOT NULL,
    \`person_id\` uuid NOT NULL,
    \`label\` varchar(120) NOT NULL,
    \`credential_hash\` char(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`last_count\` int NOT NULL,
    \`created_at\` datetime(3) NOT NULL,
    \`expires_at\` datetime(3) NOT NULL,
    \`revoked_at\` datetime(3) NULL,
    INDEX \`IX_device_person\` (\`person_id\`),
    PRIMARY KEY (\`id\`)
  ) ENGINE=InnoDB`,
  `CREATE TABLE \`session\` (
    \`session_id\` varchar(128) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`expires\` int unsigned NOT NULL,
    \`data\` mediumtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin,
    INDEX \`IX_session_expires\` (\`expires\`),
    PRIMARY KEY (\`session_id\`)
  ) ENGINE=InnoDB`,
  `CREATE TABLE \`sign_in_limit\` (
    \`key\` varchar(255) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`points\` int NOT NULL DEFAULT 0,
    \`expire\` bigint unsigned,
    PRIMARY KEY (\`key\`)
  ) ENGINE=InnoDB`,
];

export class People1764576000001 implements MigrationInterface {
  name = 'People1764576000001';

  async up(runner: QueryRunner): Promise<void> {
    for (const table of TABLES) await runner.query(table);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('DROP TABLE `sign_in_limit`');
    await runner.query('DROP TABLE `session`');
    await runner.query('DROP TABLE `device`');
    await runner.query('DROP TABLE `membership`');
    await runner.query('DROP TABLE `person`');
    await runner.query('DROP TABLE `company`');
  }
}
