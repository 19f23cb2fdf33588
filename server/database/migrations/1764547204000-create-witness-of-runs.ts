import type { MigrationInterface, QueryRunner } from 'typeorm';

export class CreateWitnessOfRuns1764547204000 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`CREATE TABLE server_key (
      id uuid PRIMARY KEY,
      public_key json NOT NULL,
      sealed_private_key text NOT NULL,
      made_at timestamptz NOT NULL
    )`);
    await runner.query(`CREATE TABLE countersignature (
      run_id uuid NOT NULL CONSTRAINT countersignature_run_fk REFERENCES run,
      branch text NOT NULL,
      seq integer NOT NULL,
      head text NOT NULL,
      at bigint NOT NULL,
      signature text NOT NULL,
      key_id uuid NOT NULL CONSTRAINT countersignature_key_fk REFERENCES server_key,
      PRIMARY KEY (run_id, branch, seq)
    )`);
    await runner.query(`CREATE TABLE refused_event (
      run_id uuid NOT NULL,
      seq integer NOT NULL,
      hash text NOT NULL,
      event text NOT NULL,
      tablet_id uuid NOT NULL,
      code text NOT NULL,
      reason text NOT NULL,
      received_at timestamptz NOT NULL,
      PRIMARY KEY (run_id, seq, hash)
    )`);
    await runner.query(`CREATE TABLE discrepancy (
      run_id uuid NOT NULL CONSTRAINT discrepancy_run_fk REFERENCES run,
      branch text NOT NULL,
      seq integer NOT NULL,
      what text NOT NULL,
      computed_by text NOT NULL,
      recorded_by text NOT NULL,
      recorded text NOT NULL,
      computed text NOT NULL,
      found_at timestamptz NOT NULL,
      PRIMARY KEY (run_id, branch, seq, what, computed_by)
    )`);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('DROP TABLE discrepancy, refused_event, countersignature, server_key');
  }
}
