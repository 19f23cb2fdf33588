import { portProblem, startSettings } from './settings.mjs';

const owner = 'postgres://owner@db.example/bayhand';
const app = 'postgres://app@db.example/bayhand';

describe('startSettings', () => {
  it('needs nothing: the demo on loopback, over a database of our own', () => {
    expect(startSettings({})).toEqual({
      host: '127.0.0.1',
      port: 4310,
      tls: undefined,
      isDemo: true,
      database: undefined,
      tokenSecret: undefined,
    });
  });

  it('takes what is set', () => {
    const settings = startSettings({
      BAYHAND_HOST: '0.0.0.0',
      BAYHAND_PORT: '4411',
      BAYHAND_DEMO: '0',
      DATABASE_URL: app,
      DATABASE_OWNER_URL: owner,
      BAYHAND_TLS_CERT: __filename,
      BAYHAND_TLS_KEY: __filename,
    });
    expect(settings).toMatchObject({
      host: '0.0.0.0',
      port: 4411,
      isDemo: false,
      database: { appUrl: app, ownerUrl: owner },
      tls: { certificate: __filename, key: __filename },
    });
  });

  it.each([
    [{ DATABASE_URL: app }, /^DATABASE_URL is set and DATABASE_OWNER_URL is not: set DATABASE_OWNER_URL to/],
    [{ DATABASE_OWNER_URL: owner }, /^DATABASE_OWNER_URL is set and DATABASE_URL is not: set DATABASE_URL to/],
    [{ BAYHAND_PORT: '0' }, /^BAYHAND_PORT is "0": set it to a whole number from 1 to 65535/],
    [{ BAYHAND_PORT: '65536' }, /^BAYHAND_PORT is "65536"/],
    [{ BAYHAND_PORT: '43x' }, /^BAYHAND_PORT is "43x"/],
    [{ BAYHAND_TLS_CERT: 'cert.pem' }, /^HTTPS needs both: set BAYHAND_TLS_CERT and BAYHAND_TLS_KEY/],
    [{ BAYHAND_TLS_CERT: __filename, BAYHAND_TLS_KEY: '/no/key.pem' }, /^BAYHAND_TLS_KEY names \/no\/key.pem, which/],
  ])('refuses %p in one sentence', (env, sentence) => {
    expect(() => startSettings(env)).toThrow(sentence);
  });
});

describe('portProblem', () => {
  const settings = startSettings({});

  it.each([
    ['EADDRINUSE', /^Port 4310 is taken by another program: end that program, or choose another port for good/],
    ['EACCES', /^This account may not listen on port 4310: choose one above 1023/],
    ['EADDRNOTAVAIL', /^This machine has no address 127.0.0.1: set BAYHAND_HOST/],
    ['EMFILE', /^Port 4310 on 127.0.0.1 can't be opened \(EMFILE\)/],
  ])('says the way out of %s', (code, sentence) => {
    expect(portProblem(code, settings)).toMatch(sentence);
  });
});
