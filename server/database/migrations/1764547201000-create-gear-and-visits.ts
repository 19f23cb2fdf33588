import type { MigrationInterface, QueryRunner } from 'typeorm';

export class CreateGearAndVisits1764547201000 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`CREATE TABLE instrument (
      id uuid PRIMARY KEY,
      site_id uuid NOT NULL CONSTRAINT instrument_site_fk REFERENCES site,
      kind text NOT NULL,
      label text NOT NULL,
      serial text NOT NULL,
      shows json NOT NULL,
      due_on date NOT NULL,
      last_checked_on date NOT NULL,
      in_use boolean NOT NULL
    )`);
    await runner.query('CREATE INDEX instrument_site ON instrument (site_id)');
    await runner.query(`CREATE TABLE visit (
      id uuid PRIMARY KEY,
      site_id uuid NOT NULL CONSTRAINT visit_site_fk REFERENCES site,
      document text NOT NULL,
      content_hash text NOT NULL,
      changed_at bigint NOT NULL
    )`);
    await runner.query(`CREATE TABLE visit_revision (
      visit_id uuid NOT NULL,
      content_hash text NOT NULL,
      document text NOT NULL,
      changed_at bigint NOT NULL,
      tablet_id uuid,
      received_at timestamptz NOT NULL,
      PRIMARY KEY (visit_id, content_hash)
    )`);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('DROP TABLE visit_revision, visit, instrument');
  }
}
