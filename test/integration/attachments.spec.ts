import { createHash, randomBytes } from 'node:crypto';
import { TestServer } from '../support/test-server';

let server: TestServer;
beforeAll(async () => {
  server = await TestServer.start();
});
afterAll(() => server.stop());

const addressOf = (bytes: Buffer) => `/api/attachments/${createHash('sha256').update(bytes).digest('hex')}`;

describe('an attachment', () => {
  it('is kept once and given back byte for byte', async () => {
    const bytes = randomBytes(200_000);
    expect((await server.ask('PUT', addressOf(bytes), { as: 'okafor', bytes })).status).toBe(201);
    expect((await server.ask('PUT', addressOf(bytes), { as: 'brandt', bytes })).status).toBe(204);
    const given = await server.ask('GET', addressOf(bytes), { as: 'lindqvist' });
    expect(given.status).toBe(200);
    expect(given.bytes.equals(bytes)).toBe(true);
    expect(given.headers.get('content-type')).toBe('application/octet-stream');
    expect(given.headers.get('x-content-type-options')).toBe('nosniff');
  });

  it('may be of 16 MB, and not of a byte more', async () => {
    const most = Buffer.alloc(16 * 1024 * 1024, 7);
    expect((await server.ask('PUT', addressOf(most), { as: 'okafor', bytes: most })).status).toBe(201);
    const more = Buffer.concat([most, Buffer.from([7])]);
    const answer = await server.ask('PUT', addressOf(more), { as: 'okafor', bytes: more });
    expect(answer).toMatchObject({ status: 413, json: { code: 'too-large', status: 413 } });
    expect((await server.ask('GET', addressOf(more), { as: 'okafor' })).status).toBe(404);
  });

  it('is refused when the bytes are not those of the address', async () => {
    const bytes = Buffer.from('one');
    const answer = await server.ask('PUT', addressOf(Buffer.from('another')), { as: 'okafor', bytes });
    expect(answer).toMatchObject({ status: 422, json: { code: 'invalid' } });
    expect((await server.ask('GET', addressOf(Buffer.from('another')), { as: 'okafor' })).status).toBe(404);
  });

  it('has an address of 64 small hexadecimal digits', async () => {
    const bytes = Buffer.from('one');
    const path = addressOf(bytes).toUpperCase().replace('/API/ATTACHMENTS', '/api/attachments');
    expect((await server.ask('PUT', path, { as: 'okafor', bytes })).status).toBe(404);
  });

  it('comes as plain bytes', async () => {
    const bytes = Buffer.from('{}');
    const answer = await server.ask('PUT', addressOf(bytes), {
      as: 'okafor',
      bytes,
      headers: { 'content-type': 'application/json' },
    });
    expect(answer).toMatchObject({ status: 415, json: { code: 'wrong-media-type' } });
  });
});
