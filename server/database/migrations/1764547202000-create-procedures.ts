import type { MigrationInterface, QueryRunner } from 'typeorm';

export class CreateProcedures1764547202000 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`CREATE TABLE procedure_draft (
      id uuid PRIMARY KEY,
      procedure_id text NOT NULL,
      title text NOT NULL,
      document text NOT NULL,
      content_hash text NOT NULL,
      imported_by uuid NOT NULL CONSTRAINT procedure_draft_imported_by_fk REFERENCES person,
      imported_at timestamptz NOT NULL,
      published_version integer
    )`);
    await runner.query('CREATE INDEX procedure_draft_procedure ON procedure_draft (procedure_id)');
    await runner.query(`CREATE TABLE procedure_version (
      procedure_id text NOT NULL,
      version integer NOT NULL,
      title text NOT NULL,
      document text NOT NULL,
      content_hash text NOT NULL,
      published_by uuid NOT NULL CONSTRAINT procedure_version_published_by_fk REFERENCES person,
      published_at timestamptz NOT NULL,
      PRIMARY KEY (procedure_id, version)
    )`);
    await runner.query(`CREATE TABLE procedure_withdrawal (
      procedure_id text NOT NULL,
      version integer NOT NULL,
      reason text NOT NULL,
      withdrawn_by uuid NOT NULL CONSTRAINT procedure_withdrawal_withdrawn_by_fk REFERENCES person,
      withdrawn_at timestamptz NOT NULL,
      PRIMARY KEY (procedure_id, version),
      CONSTRAINT procedure_withdrawal_version_fk FOREIGN KEY (procedure_id, version) REFERENCES procedure_version
    )`);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('DROP TABLE procedure_withdrawal, procedure_version, procedure_draft');
  }
}
