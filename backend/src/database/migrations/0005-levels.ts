import type { MigrationInterface, QueryRunner } from 'typeorm';

/**
 * A system's and a suction group's own work stands beside the circuits': a row with its level, assigned, recorded,
 * reviewed and approved in the same way. Openings that have a schedule already get theirs with the next import.
 */
const CHANGES = [
  `ALTER TABLE \`circuit\`
    ADD COLUMN \`level\` varchar(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL DEFAULT 'circuit' AFTER \`opening_id\`,
    ADD COLUMN \`system_id\` uuid NULL AFTER \`level\`,
    MODIFY COLUMN \`suction_group_id\` uuid NULL,
    MODIFY COLUMN \`code\` varchar(170) NOT NULL`,
  `UPDATE \`circuit\` c JOIN \`suction_group\` g ON g.id = c.suction_group_id SET c.system_id = g.system_id`,
  `ALTER TABLE \`circuit\`
    MODIFY COLUMN \`level\` varchar(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    MODIFY COLUMN \`system_id\` uuid NOT NULL,
    DROP INDEX \`UQ_circuit_code\`,
    ADD UNIQUE INDEX \`UQ_circuit_code\` (\`opening_id\`, \`level\`, \`code\`)`,
];

export class Levels1764576000005 implements MigrationInterface {
  name = 'Levels1764576000005';

  async up(runner: QueryRunner): Promise<void> {
    for (const change of CHANGES) await runner.query(change);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query("DELETE FROM `circuit` WHERE `level` <> 'circuit'");
    await runner.query(
      `ALTER TABLE \`circuit\` DROP INDEX \`UQ_circuit_code\`, DROP COLUMN \`level\`, DROP COLUMN \`system_id\`,
        MODIFY COLUMN \`suction_group_id\` uuid NOT NULL, MODIFY COLUMN \`code\` varchar(40) NOT NULL,
        ADD UNIQUE INDEX \`UQ_circuit_code\` (\`opening_id\`, \`code\`)`,
    );
  }
}
