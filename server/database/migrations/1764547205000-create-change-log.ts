import type { MigrationInterface, QueryRunner } from 'typeorm';

export class CreateChangeLog1764547205000 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`CREATE TABLE change_counter (
      id smallint PRIMARY KEY CONSTRAINT change_counter_one_row CHECK (id = 1),
      position bigint NOT NULL
    )`);
    await runner.query('INSERT INTO change_counter (id, position) VALUES (1, 0)');
    await runner.query(`CREATE TABLE change_log (
      position bigint PRIMARY KEY,
      kind text NOT NULL,
      item_id text NOT NULL
    )`);
    await runner.query(`CREATE TABLE epoch (
      id smallint PRIMARY KEY CONSTRAINT epoch_one_row CHECK (id = 1),
      epoch text NOT NULL,
      begun_at timestamptz NOT NULL
    )`);
    await runner.query(
      `INSERT INTO epoch (id, epoch, begun_at) VALUES (1, replace(gen_random_uuid()::text, '-', ''), now())`,
    );
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('DROP TABLE epoch, change_log, change_counter');
  }
}
