import { appendFileSync, existsSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { createServer } from 'node:net';
import { join } from 'node:path';
import { StartCheckout } from '../support/start-checkout';

jest.setTimeout(60_000);

const isServed = async (port: number) =>
  fetch(`http://127.0.0.1:${port}/`).then(
    (response) => response.ok,
    () => false,
  );

describe('npm start', () => {
  let checkout: StartCheckout;
  beforeEach(async () => (checkout = await StartCheckout.make()));
  afterEach(() => checkout.remove());

  const inFolder = (...path: string[]) => join(checkout.folder, ...path);
  const prepared = () => readFileSync(inFolder('prepared.txt'), 'utf8').trim().split('\n');
  /** The id of the process that runs the database, by its own note; undefined when none does. */
  const databaseProcess = () => {
    const note = inFolder('.data/postgres/cluster/postmaster.pid');
    if (!existsSync(note)) return undefined;
    const id = readFileSync(note, 'utf8').split('\n')[0];
    return existsSync(`/proc/${id}`) ? id : undefined;
  };

  it('builds, makes a database, serves, and on Ctrl-C stops all of it', async () => {
    const started = await checkout.start();
    expect(started.said).toContain(`Bayhand is at http://127.0.0.1:${checkout.port}/\nStop it with Ctrl-C`);
    expect(started.said).toMatch(/Building the server: done[^]*Building the app: done[^]*Making a database: done/);
    expect(await isServed(checkout.port)).toBe(true);
    expect(prepared()).toEqual([
      expect.stringMatching(/^postgres:\/\/bayhand_owner:[\w-]{43}@127\.0\.0\.1:\d+\/bayhand$/),
    ]);
    expect(databaseProcess()).toBeDefined();
    expect(statSync(inFolder('.data/secrets.json')).mode & 0o777).toBe(0o600);

    started.child.kill('SIGINT');
    await started.ended;
    expect(started.code).toBe(0);
    expect(started.said).toMatch(/Stopping Bayhand \.\.\.\nBayhand is stopped\.\n$/);
    expect(await isServed(checkout.port)).toBe(false);
    expect(databaseProcess()).toBeUndefined();
  });

  it('does nothing twice at the second start, and rebuilds only what changed at the third', async () => {
    for (const expected of [/Building the app/, /^Bayhand is at/]) {
      const started = await checkout.start();
      expect(started.said).toMatch(expected);
      started.child.kill('SIGTERM');
      await started.ended;
    }
    writeFileSync(inFolder('angular.json'), '{}');
    const third = await checkout.start();
    expect(third.said).toMatch(/^Building the app \.\.\.\nBuilding the app: done in [\d.]+ s\.\nBayhand is at/);
    const passwords = prepared().map((url) => new URL(url).password);
    expect(new Set(passwords).size).toBe(1);
  });

  it('clears away what a killed start left running', async () => {
    const killed = await checkout.start();
    const database = databaseProcess();
    killed.child.kill('SIGKILL');
    await killed.ended;
    expect(await isServed(checkout.port)).toBe(true);

    const next = await checkout.start();
    expect(next.said).toMatch(
      /^An earlier start was killed and left its server running \(process \d+\): stopping it\.$/m,
    );
    expect(next.said).toContain('Bayhand is at');
    expect(databaseProcess()).not.toBe(database);
  });

  it('makes new passwords where the kept ones are lost, and keeps the database', async () => {
    const first = await checkout.start();
    first.child.kill('SIGTERM');
    await first.ended;
    rmSync(inFolder('.data/secrets.json'));
    const second = await checkout.start();
    expect(second.said).toContain('Bayhand is at');
    expect(second.said).not.toContain('Making a database');
    const passwords = prepared().map((url) => new URL(url).password);
    expect(passwords[1]).not.toBe(passwords[0]);
  });

  describe('ends with one sentence and code 1', () => {
    const refused = async (sentence: string | RegExp, env?: NodeJS.ProcessEnv) => {
      const started = await checkout.start(env);
      await started.ended;
      expect(started.said).toMatch(sentence);
      expect(started.said).not.toMatch(/^\s+at /m); // no stack
      expect(started.code).toBe(1);
      expect(databaseProcess()).toBeUndefined();
    };

    it('where its port is taken', async () => {
      const other = createServer().listen(checkout.port, '127.0.0.1');
      await refused(new RegExp(`^Port ${checkout.port} is taken by another program: end that program, or choose`));
      other.close();
    });

    it('where it runs already', async () => {
      const first = await checkout.start();
      const second = await checkout.start();
      await second.ended;
      expect(second.said).toBe(
        `Bayhand already runs from this folder: stop it with Ctrl-C where it was started, or with "kill ${first.child.pid}".\n`,
      );
      expect(second.code).toBe(1);
      expect(await isServed(checkout.port)).toBe(true);
    });

    it("where the owner's URL is missing", async () => {
      await refused(/^DATABASE_URL is set and DATABASE_OWNER_URL is not: set DATABASE_OWNER_URL to [^\n]*\n$/, {
        DATABASE_URL: 'postgres://app@127.0.0.1/x',
      });
    });

    it("where the database's folder is damaged", async () => {
      const first = await checkout.start();
      first.child.kill('SIGTERM');
      await first.ended;
      rmSync(inFolder('.data/postgres/cluster/global/pg_control'));
      await refused(
        /^The database in .*\/\.data\/postgres does not start: its files are damaged\. Put .* back from a copy/,
      );
    });

    it('where another version of PostgreSQL made the database', async () => {
      const first = await checkout.start();
      first.child.kill('SIGTERM');
      await first.ended;
      writeFileSync(inFolder('.data/postgres/cluster/PG_VERSION'), '9\n');
      await refused(
        /^The database in .* was made by PostgreSQL 9, and this machine has [\d, ]+: install postgresql-9, or/,
      );
    });

    it('where a file is in the place of its folder', async () => {
      writeFileSync(inFolder('.data'), '');
      await refused(
        /^Something else is in the place of .*\/\.data: move it away, then run the same command again\.\n$/,
      );
    });

    it('where a build fails', async () => {
      writeFileSync(
        inFolder('package.json'),
        JSON.stringify({ scripts: { 'build:document': 'echo wrong step; false' } }),
      );
      await refused(
        /Building the checks of documents: it failed, and "npm run build:document" shows the same:\nwrong step/,
      );
    });

    it('where the server does not come up', async () => {
      appendFileSync(inFolder('stub/server/main.js'), "console.log('no key'); process.exit(3);");
      await refused(/The server ended with code 3\. The end of its log \(.*server\.log\):\nno key\nMend that, then/);
    });

    it('where the database can not be prepared', async () => {
      writeFileSync(inFolder('stub/server/database/prepare.js'), "console.error('No.'); process.exit(1);");
      await refused(/The database could not be prepared: No\.\nMend that, then run the same command again\.\n$/);
    });
  });
});
