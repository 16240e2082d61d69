import type { MigrationInterface, QueryRunner } from 'typeorm';

const TABLES = [
  `CREATE TABLE \`opening\` (
    \`id\` uuid NOT NULL,
    \`company_id\` uuid NOT NULL,
    \`name\` varchar(120) NOT NULL,
    \`address\` varchar(300) NOT NULL,
    \`elevation_m\` double NOT NULL,
    \`opening_date\` date NOT NULL,
    \`time_zone\` varchar(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`contractor_name\` varchar(120) NOT NULL,
    \`unit_system\` varchar(8) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`language\` varchar(8) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`schedule_revision\` int NOT NULL,
    \`created_at\` datetime(3) NOT NULL,
    INDEX \`IX_opening_company\` (\`company_id\`),
    PRIMARY KEY (\`id\`)
  ) ENGINE=InnoDB`,
  `CREATE TABLE \`plant_system\` (
    \`id\` uuid NOT NULL,
    \`company_id\` uuid NOT NULL,
    \`opening_id\` uuid NOT NULL,
    \`name\` varchar(80) NOT NULL,
    \`kind\` varchar(24) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`refrigerant\` varchar(24) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`ordinal\` int NOT NULL,
    \`removed_at\` datetime(3) NULL,
    UNIQUE INDEX \`UQ_plant_system_name\` (\`opening_id\`, \`name\`),
    PRIMARY KEY (\`id\`)
  ) ENGINE=InnoDB`,
  `CREATE TABLE \`suction_group\` (
    \`id\` uuid NOT NULL,
    \`company_id\` uuid NOT NULL,
    \`opening_id\` uuid NOT NULL,
    \`system_id\` uuid NOT NULL,
    \`name\` varchar(80) NOT NULL,
    \`temperature_class\` varchar(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`saturated_suction_temperature_k\` double NOT NULL,
    \`ordinal\` int NOT NULL,
    \`removed_at\` datetime(3) NULL,
    UNIQUE INDEX \`UQ_suction_group_name\` (\`system_id\`, \`name\`),
    PRIMARY KEY (\`id\`)
  ) ENGINE=InnoDB`,
  `CREATE TABLE \`circuit\` (
    \`id\` uuid NOT NULL,
    \`company_id\` uuid NOT NULL,
    \`opening_id\` uuid NOT NULL,
    \`suction_group_id\` uuid NOT NULL,
    \`code\` varchar(40) NOT NULL,
    \`description\` varchar(200) NOT NULL,
    \`area\` varchar(80) NOT NULL,
    \`temperature_class\` varchar(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`feed\` varchar(32) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`control\` varchar(32) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`load_w\` double NULL,
    \`defrost_type\` varchar(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`defrost_per_day\` int NOT NULL,
    \`defrost_fail_safe_s\` double NULL,
    \`defrost_termination_temperature_k\` double NULL,
    \`defrost_drip_s\` double NULL,
    \`assignee_id\` uuid NULL,
    \`ordinal\` int NOT NULL,
    \`revision\` int NOT NULL,
    \`removed_at\` datetime(3) NULL,
    INDEX \`IX_circuit_assignee\` (\`assignee_id\`, \`opening_id\`),
    INDEX \`IX_circuit_group\` (\`suction_group_id\`),
    UNIQUE INDEX \`UQ_circuit_code\` (\`opening_id\`, \`code\`),
    PRIMARY KEY (\`id\`)
  ) ENGINE=InnoDB`,
  `CREATE TABLE \`fixture\` (
    \`id\` uuid NOT NULL,
    \`company_id\` uuid NOT NULL,
    \`opening_id\` uuid NOT NULL,
    \`circuit_id\` uuid NOT NULL,
    \`tag\` varchar(40) NOT NULL,
    \`description\` varchar(200) NOT NULL,
    \`kind\` varchar(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`length_m\` double NULL,
    \`evaporating_temperature_k\` double NOT NULL,
    \`evaporating_basis\` varchar(8) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`discharge_air_temperature_k\` double NOT NULL,
    \`superheat_low_k\` double NOT NULL,
    \`superheat_high_k\` double NOT NULL,
    \`valve_kind\` varchar(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    \`ordinal\` int NOT NULL,
    \`removed_at\` datetime(3) NULL,
    UNIQUE INDEX \`UQ_fixture_tag\` (\`circuit_id\`, \`tag\`),
    PRIMARY KEY (\`id\`)
  ) ENGINE=InnoDB`,
  `CREATE TABLE \`coil\` (
    \`id\` uuid NOT NULL,
    \`company_id\` uuid NOT NULL,
    \`opening_id\` uuid NOT NULL,
    \`circuit_id\` uuid NOT NULL,
    \`fixture_id\` uuid NOT NULL,
    \`number\` int NOT NULL,
    \`removed_at\` datetime(3) NULL,
    UNIQUE INDEX \`UQ_coil_number\` (\`fixture_id\`, \`number\`),
    PRIMARY KEY (\`id\`)
  ) ENGINE=InnoDB`,
];

export class Plant1764576000002 implements MigrationInterface {
  name = 'Plant1764576000002';

  async up(runner: QueryRunner): Promise<void> {
    for (const table of TABLES) await runner.query(table);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('DROP TABLE `coil`');
    await runner.query('DROP TABLE `fixture`');
    await runner.query('DROP TABLE `circuit`');
    await runner.query('DROP TABLE `suction_group`');
    await runner.query('DROP TABLE `plant_system`');
    await runner.query('DROP TABLE `opening`');
  }
}
