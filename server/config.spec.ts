import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { ConfigProblem, loadConfig, loadPrepareConfig } from './config';

const least = { DATABASE_URL: 'postgres://app:pw@db.example/bayhand', BAYHAND_TOKEN_SECRET: 's'.repeat(32) };

function problems(load: () => unknown): readonly string[] {
  try {
    load();
  } catch (error) {
    if (error instanceof ConfigProblem) return error.problems;
    throw error;
  }
  return [];
}

describe('the settings of the server', () => {
  it('need a database and a secret, and have an answer for the rest', () => {
    expect(loadConfig(least)).toMatchObject({
      host: '127.0.0.1',
      port: 4310,
      databaseUrl: least.DATABASE_URL,
      isDemo: false,
      tls: undefined,
      publicUrl: undefined,
      logLevel: 'info',
    });
  });

  it('are taken from the environment', () => {
    const env = { ...least, HOST: '::', PORT: '80', BAYHAND_DEMO: '1', BAYHAND_PUBLIC_URL: 'https://bayhand.example' };
    const config = loadConfig({ ...env, BAYHAND_APP_DIR: '/srv/app' });
    expect(config).toMatchObject({ host: '::', port: 80, isDemo: true, appDir: '/srv/app' });
    expect(config.publicUrl?.protocol).toBe('https:');
  });

  it('tell all that is wrong together, without a secret in it', () => {
    const found = problems(() =>
      loadConfig({
        PORT: '70000',
        DATABASE_URL: 'mysql://app:hidden-password@db/bayhand',
        BAYHAND_TOKEN_SECRET: 'short-secret',
        BAYHAND_DEMO: 'yes',
        BAYHAND_TLS_CERT: '/nowhere/cert.pem',
        BAYHAND_TLS_KEY: '/nowhere/key.pem',
        BAYHAND_PUBLIC_URL: 'bayhand',
        BAYHAND_LOG_LEVEL: 'loud',
      }),
    );
    expect(found.map((text) => /^[A-Z_]+/.exec(text)?.[0])).toEqual([
      'PORT',
      'DATABASE_URL',
      'BAYHAND_TOKEN_SECRET',
      'BAYHAND_DEMO',
      'BAYHAND_TLS_CERT',
      'BAYHAND_TLS_KEY',
      'BAYHAND_PUBLIC_URL',
      'BAYHAND_LOG_LEVEL',
    ]);
    expect(found.join()).not.toMatch(/hidden-password|short-secret/);
  });

  it('take a certificate and its key together', () => {
    const folder = mkdtempSync(join(tmpdir(), 'bayhand-tls-'));
    const path = join(folder, 'a.pem');
    writeFileSync(path, 'PEM');
    const config = loadConfig({ ...least, BAYHAND_TLS_CERT: path, BAYHAND_TLS_KEY: path });
    expect(config.tls).toEqual({ cert: Buffer.from('PEM'), key: Buffer.from('PEM') });
    expect(problems(() => loadConfig({ ...least, BAYHAND_TLS_CERT: path }))).toEqual([expect.stringMatching(/both/)]);
    rmSync(folder, { recursive: true });
  });
});

describe('the settings of prepare', () => {
  it('name the serving role and the owner', () => {
    const env = { DATABASE_URL: 'postgres://app%2D1:pw@db/bayhand', DATABASE_OWNER_URL: 'postgres://owner@db/bayhand' };
    expect(loadPrepareConfig(env)).toEqual({ ownerUrl: env.DATABASE_OWNER_URL, appRole: 'app-1', isDemo: false });
  });

  it('must not be one role for both', () => {
    const url = 'postgres://owner:pw@db/bayhand';
    expect(problems(() => loadPrepareConfig({ DATABASE_URL: url, DATABASE_OWNER_URL: url }))).toEqual([
      expect.stringMatching(/same role/),
    ]);
    expect(problems(() => loadPrepareConfig({}))).toHaveLength(2);
  });
});
