import type { MigrationInterface, QueryRunner } from 'typeorm';

const TABLES = [
  `CREATE TABLE \`template_version\` (
    \`id\` uuid NOT NULL,
    \`company_id\` uuid NOT NULL,
    \`key\` varchar(80) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`version\` int NOT NULL,
    \`source\` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL,
    \`source_hash\` char(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`created_at\` datetime(3) NOT NULL,
    UNIQUE INDEX \`UQ_template_version\` (\`company_id\`, \`key\`, \`version\`),
    PRIMARY KEY (\`id\`)
  ) ENGINE=InnoDB`,
  `CREATE TABLE \`step_list\` (
    \`company_id\` uuid NOT NULL,
    \`hash\` char(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`opening_id\` uuid NOT NULL,
    \`content\` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL,
    \`created_at\` datetime(3) NOT NULL,
    PRIMARY KEY (\`company_id\`, \`hash\`)
  ) ENGINE=InnoDB`,
  `CREATE TABLE \`sequence\` (
    \`id\` uuid NOT NULL,
    \`company_id\` uuid NOT NULL,
    \`opening_id\` uuid NOT NULL,
    \`circuit_id\` uuid NOT NULL,
    \`state\` varchar(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`step_list_hash\` char(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`fold\` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL,
    \`head_position\` int NOT NULL,
    \`head_hash\` char(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`round\` int NOT NULL,
    \`steps_total\` int NOT NULL,
    \`steps_done\` int NOT NULL,
    \`outside_count\` int NOT NULL,
    \`not_applicable_count\` int NOT NULL,
    \`answered_twice_count\` int NOT NULL,
    \`late_count\` int NOT NULL,
    \`submitted_at\` datetime(3) NULL,
    \`submitted_by\` uuid NULL,
    \`created_at\` datetime(3) NOT NULL,
    INDEX \`IX_sequence_opening_state\` (\`opening_id\`, \`state\`, \`submitted_at\`),
    UNIQUE INDEX \`UQ_sequence_circuit\` (\`circuit_id\`),
    PRIMARY KEY (\`id\`)
  ) ENGINE=InnoDB`,
  `CREATE TABLE \`entry\` (
    \`id\` uuid NOT NULL,
    \`company_id\` uuid NOT NULL,
    \`sequence_id\` uuid NOT NULL,
    \`position\` int NOT NULL,
    \`author_id\` uuid NOT NULL,
    \`device_id\` uuid NULL,
    \`device_count\` int NOT NULL,
    \`kind\` varchar(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`standing\` varchar(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`received_at\` datetime(3) NOT NULL,
    \`body\` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL,
    \`body_hash\` char(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`server_part\` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL,
    \`previous_hash\` char(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`hash\` char(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    INDEX \`IX_entry_device\` (\`device_id\`, \`device_count\`),
    UNIQUE INDEX \`UQ_entry_position\` (\`sequence_id\`, \`position\`),
    PRIMARY KEY (\`id\`)
  ) ENGINE=InnoDB`,
  `CREATE TABLE \`photo\` (
    \`sequence_id\` uuid NOT NULL,
    \`sha256\` char(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`company_id\` uuid NOT NULL,
    \`opening_id\` uuid NOT NULL,
    \`person_id\` uuid NOT NULL,
    \`bytes\` int NOT NULL,
    \`width\` int NOT NULL,
    \`height\` int NOT NULL,
    \`state\` varchar(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`failure\` varchar(300) NULL,
    \`created_at\` datetime(3) NOT NULL,
    INDEX \`IX_photo_company\` (\`company_id\`, \`sha256\`),
    PRIMARY KEY (\`sequence_id\`, \`sha256\`)
  ) ENGINE=InnoDB`,
  `CREATE TABLE \`review\` (
    \`id\` uuid NOT NULL,
    \`company_id\` uuid NOT NULL,
    \`sequence_id\` uuid NOT NULL,
    \`entry_id\` uuid NOT NULL,
    \`reviewer_id\` uuid NOT NULL,
    \`verdict\` varchar(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`head_hash\` char(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`statement\` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL,
    \`installation_signature\` varchar(128) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`key_fingerprint\` char(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`created_at\` datetime(3) NOT NULL,
    INDEX \`IX_review_sequence\` (\`sequence_id\`),
    PRIMARY KEY (\`id\`)
  ) ENGINE=InnoDB`,
  `CREATE TABLE \`audit\` (
    \`id\` uuid NOT NULL,
    \`company_id\` uuid NOT NULL,
    \`opening_id\` uuid NULL,
    \`person_id\` uuid NULL,
    \`action\` varchar(48) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`subject\` varchar(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`before\` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NULL,
    \`after\` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NULL,
    \`created_at\` datetime(3) NOT NULL,
    INDEX \`IX_audit_company\` (\`company_id\`, \`created_at\`),
    PRIMARY KEY (\`id\`)
  ) ENGINE=InnoDB`,
];

export class Records1764576000003 implements MigrationInterface {
  name = 'Records1764576000003';

  async up(runner: QueryRunner): Promise<void> {
    for (const table of TABLES) await runner.query(table);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('DROP TABLE `audit`');
    await runner.query('DROP TABLE `review`');
    await runner.query('DROP TABLE `photo`');
    await runner.query('DROP TABLE `entry`');
    await runner.query('DROP TABLE `sequence`');
    await runner.query('DROP TABLE `step_list`');
    await runner.query('DROP TABLE `template_version`');
  }
}
