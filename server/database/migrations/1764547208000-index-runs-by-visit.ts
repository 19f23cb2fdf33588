import type { MigrationInterface, QueryRunner } from 'typeorm';

export class IndexRunsByVisit1764547208000 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    await runner.query('CREATE INDEX run_visit ON run (visit_id, procedure_id)');
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('DROP INDEX run_visit');
  }
}
