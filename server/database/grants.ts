import type { DataSource } from 'typeorm';
import { appendOnlyTables } from './append-only';

/**
 * Gives the serving role what it needs and no more: reading and adding everywhere, changing only where nothing is
 * append-only. Run by the owner after each migration; safe to repeat.
 */
export async function grantToApp(database: DataSource, appRole: string): Promise<void> {
  const role = `"${appRole.replaceAll('"', '""')}"`;
  const fixed: readonly string[] = appendOnlyTables;
  await database.transaction(async (manager) => {
    const rows = await manager.query<{ name: string }[]>(
      `SELECT tablename AS name FROM pg_tables WHERE schemaname = 'public'`,
    );
    await manager.query(`GRANT USAGE ON SCHEMA public TO ${role}`);
    for (const { name } of rows) {
      const rights =
        name === 'migration' ? 'SELECT' : fixed.includes(name) ? 'SELECT, INSERT' : 'SELECT, INSERT, UPDATE, DELETE';
      await manager.query(`REVOKE ALL ON TABLE "${name}" FROM PUBLIC, ${role}`);
      await manager.query(`GRANT ${rights} ON TABLE "${name}" TO ${role}`);
    }
  });
}
