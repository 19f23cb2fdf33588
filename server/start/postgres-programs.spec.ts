import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { installedPostgres, programsFor } from './postgres-programs.mjs';

describe('the PostgreSQL of this machine', () => {
  let folder: string;
  beforeEach(() => (folder = mkdtempSync(join(tmpdir(), 'bayhand-start-'))));
  afterEach(() => rmSync(folder, { recursive: true }));

  const install = (version: string, programs: string[]) => {
    const bin = join(folder, version, 'bin');
    mkdirSync(bin, { recursive: true });
    for (const program of programs) writeFileSync(join(bin, program), '', { mode: 0o755 });
  };
  const server = ['initdb', 'pg_ctl', 'postgres'];

  it('is each version with its server, the newest first', () => {
    install('15', server);
    install('17', server);
    install('13', server); // too old
    install('16', ['psql']); // a client alone
    expect(installedPostgres(folder)).toEqual([
      { version: 17, folder: join(folder, '17/bin') },
      { version: 15, folder: join(folder, '15/bin') },
    ]);
    expect(installedPostgres(join(folder, 'nowhere'))).toEqual([]);
  });

  it('is for a cluster the version that made it', () => {
    const installed = [17, 15].map((version) => ({ version, folder: `/pg/${version}` }));
    expect(programsFor(undefined, '/place', installed).version).toBe(17);
    expect(programsFor(15, '/place', installed).version).toBe(15);
    expect(() => programsFor(16, '/place', installed)).toThrow(
      'The database in /place was made by PostgreSQL 16, and this machine has 17, 15: install postgresql-16, or move that folder away to begin with an empty database.',
    );
  });
});
