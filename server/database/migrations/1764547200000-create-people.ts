import type { MigrationInterface, QueryRunner } from 'typeorm';

export class CreatePeople1764547200000 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`CREATE TABLE site (
      id uuid PRIMARY KEY,
      name text NOT NULL,
      elevation_m double precision NOT NULL
    )`);
    await runner.query(`CREATE TABLE person (
      id uuid PRIMARY KEY,
      site_id uuid NOT NULL CONSTRAINT person_site_fk REFERENCES site,
      name text NOT NULL CONSTRAINT person_name UNIQUE,
      display_name text NOT NULL,
      role text NOT NULL CONSTRAINT person_role CHECK (role IN ('technician', 'lead', 'apprentice', 'manager')),
      password_hash text NOT NULL,
      is_active boolean NOT NULL
    )`);
    await runner.query(`CREATE TABLE sign_in_attempt (
      name text PRIMARY KEY,
      failures integer NOT NULL,
      last_at timestamptz NOT NULL,
      locked_until timestamptz NOT NULL
    )`);
    await runner.query(`CREATE TABLE tablet (
      id uuid PRIMARY KEY,
      label text NOT NULL,
      public_key json NOT NULL,
      enrolled_by uuid NOT NULL CONSTRAINT tablet_enrolled_by_fk REFERENCES person,
      enrolled_at timestamptz NOT NULL
    )`);
    await runner.query(`CREATE TABLE session (
      id uuid PRIMARY KEY,
      person_id uuid NOT NULL CONSTRAINT session_person_fk REFERENCES person,
      tablet_id uuid,
      opened_at timestamptz NOT NULL,
      ended_at timestamptz,
      ended_because text
    )`);
    await runner.query('CREATE INDEX session_person ON session (person_id)');
    await runner.query(`CREATE TABLE refresh_token (
      id uuid PRIMARY KEY,
      session_id uuid NOT NULL CONSTRAINT refresh_token_session_fk REFERENCES session,
      predecessor_id uuid,
      token_hash text NOT NULL CONSTRAINT refresh_token_hash UNIQUE,
      issued_at timestamptz NOT NULL,
      expires_at timestamptz NOT NULL,
      used_at timestamptz
    )`);
    await runner.query('CREATE INDEX refresh_token_session ON refresh_token (session_id)');
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('DROP TABLE refresh_token, session, tablet, sign_in_attempt, person, site');
  }
}
