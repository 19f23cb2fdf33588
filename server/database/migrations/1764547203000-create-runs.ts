import type { MigrationInterface, QueryRunner } from 'typeorm';

export class CreateRuns1764547203000 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`CREATE TABLE run (
      run_id uuid PRIMARY KEY,
      header text NOT NULL,
      procedure_id text NOT NULL,
      version integer NOT NULL,
      procedure_title text NOT NULL,
      site_id uuid NOT NULL CONSTRAINT run_site_fk REFERENCES site,
      visit_id uuid NOT NULL,
      received_at timestamptz NOT NULL,
      status text NOT NULL,
      repair_order text NOT NULL,
      car text NOT NULL,
      vin text NOT NULL,
      person_name text NOT NULL,
      opened_at bigint NOT NULL,
      closed_at bigint,
      finding text,
      verdict text,
      result text,
      searched text NOT NULL,
      CONSTRAINT run_procedure_version_fk FOREIGN KEY (procedure_id, version) REFERENCES procedure_version
    )`);
    await runner.query('CREATE INDEX run_opened ON run (opened_at, run_id)');
    await runner.query('CREATE INDEX run_closed ON run (closed_at, run_id)');
    await runner.query('CREATE INDEX run_finding_opened ON run (finding, opened_at, run_id)');
    await runner.query('CREATE INDEX run_procedure_opened ON run (procedure_id, opened_at, run_id)');
    await runner.query('CREATE INDEX run_person_name ON run (person_name, run_id)');
    await runner.query('CREATE INDEX run_repair_order ON run (repair_order, run_id)');
    await runner.query(`CREATE TABLE run_branch (
      run_id uuid NOT NULL CONSTRAINT run_branch_run_fk REFERENCES run,
      branch text NOT NULL,
      parent text,
      from_seq integer NOT NULL,
      head_seq integer NOT NULL,
      head text NOT NULL,
      state text NOT NULL,
      state_build text NOT NULL,
      PRIMARY KEY (run_id, branch)
    )`);
    await runner.query(`CREATE TABLE run_event (
      run_id uuid NOT NULL CONSTRAINT run_event_run_fk REFERENCES run,
      branch text NOT NULL,
      seq integer NOT NULL CONSTRAINT run_event_seq CHECK (seq > 0),
      hash text NOT NULL,
      event text NOT NULL,
      received_at timestamptz NOT NULL,
      PRIMARY KEY (run_id, branch, seq)
    )`);
    await runner.query(`CREATE TABLE run_attachment (
      run_id uuid NOT NULL CONSTRAINT run_attachment_run_fk REFERENCES run,
      sha256 text NOT NULL,
      PRIMARY KEY (run_id, sha256)
    )`);
    await runner.query(`CREATE TABLE attachment (
      sha256 text PRIMARY KEY,
      bytes bytea NOT NULL,
      received_at timestamptz NOT NULL
    )`);
    // Compressed already by the tablet.
    await runner.query('ALTER TABLE attachment ALTER COLUMN bytes SET STORAGE EXTERNAL');
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('DROP TABLE attachment, run_attachment, run_event, run_branch, run');
  }
}
