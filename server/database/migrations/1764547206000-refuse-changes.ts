import type { MigrationInterface, QueryRunner } from 'typeorm';

/** A migration names its tables itself: what it did must not change when a list elsewhere does. */
const tables = [
  'run_event',
  'procedure_version',
  'procedure_withdrawal',
  'countersignature',
  'refused_event',
  'discrepancy',
  'attachment',
  'visit_revision',
];

/**
 * Grants alone are one careless GRANT away from a changeable record. The triggers refuse everyone but the owner (who
 * needs it for retention): for each row, and for whole statements, which also catches TRUNCATE.
 */
export class RefuseChanges1764547206000 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`CREATE FUNCTION refuse_change() RETURNS trigger LANGUAGE plpgsql AS $$
      BEGIN
        IF current_user <> (SELECT pg_get_userbyid(relowner) FROM pg_class WHERE oid = TG_RELID) THEN
          RAISE EXCEPTION '% is append-only: % is refused', TG_TABLE_NAME, TG_OP USING ERRCODE = 'insufficient_privilege';
        END IF;
        IF TG_LEVEL = 'ROW' AND TG_OP = 'UPDATE' THEN
          RETURN NEW;
        END IF;
        RETURN OLD;
      END
    $$`);
    for (const table of tables) {
      await runner.query(`CREATE TRIGGER refuse_row_change BEFORE UPDATE OR DELETE ON ${table}
        FOR EACH ROW EXECUTE FUNCTION refuse_change()`);
      await runner.query(`CREATE TRIGGER refuse_change BEFORE UPDATE OR DELETE OR TRUNCATE ON ${table}
        FOR EACH STATEMENT EXECUTE FUNCTION refuse_change()`);
    }
  }

  async down(runner: QueryRunner): Promise<void> {
    for (const table of tables) {
      await runner.query(`DROP TRIGGER refuse_row_change ON ${table}`);
      await runner.query(`DROP TRIGGER refuse_change ON ${table}`);
    }
    await runner.query('DROP FUNCTION refuse_change()');
  }
}
