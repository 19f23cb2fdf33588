import 'fake-indexeddb/auto';
import { TestBed } from '@angular/core/testing';
import { OfflineStore } from './offline-store';
import { Tablet } from './tablet';
import { asked, closeStores, coreForSpecs } from './testing/core-for-specs';

describe('Tablet', () => {
  afterEach(() => closeStores());

  it('registers the public half of a key whose private half cannot be read out', async () => {
    const { server } = coreForSpecs();
    const tablet = TestBed.inject(Tablet);
    const registered = tablet.register('Tablet B2');
    const request = await asked(server, 'POST', '/api/tablets');
    expect(request.request.body).toMatchObject({ label: 'Tablet B2', publicKey: { kty: 'EC', crv: 'P-256' } });
    expect(request.request.body.publicKey.d).toBeUndefined();
    request.flush({ id: 't-1', label: 'Tablet B2' });
    expect(await registered).toBe('registered');

    const row = (await TestBed.inject(OfflineStore).keys.get('tablet'))!;
    expect(row.tabletId).toBe('t-1');
    expect(row.privateKey.extractable).toBe(false);
    await expect(crypto.subtle.exportKey('jwk', row.privateKey)).rejects.toThrow();
  });

  it('signs so that the registered key verifies, and nothing else does', async () => {
    const { server } = coreForSpecs();
    const tablet = TestBed.inject(Tablet);
    const registered = tablet.register();
    const request = await asked(server, 'POST', '/api/tablets');
    expect(request.request.body.label).toMatch(/^Tablet [A-Z0-9]{4}$/);
    request.flush({ id: 't-1', label: 'x' });
    await registered;

    const body = new TextEncoder().encode('{"device":"t-1"}');
    const text = await tablet.sign(body);
    expect(text).toMatch(/^[A-Za-z0-9_-]{86}$/);
    const signature = Uint8Array.from(Buffer.from(text, 'base64url'));
    const { x, y } = request.request.body.publicKey as JsonWebKey;
    const algorithm = { name: 'ECDSA', namedCurve: 'P-256' };
    const key = await crypto.subtle.importKey('jwk', { kty: 'EC', crv: 'P-256', x, y }, algorithm, false, ['verify']);
    const verify = (data: Uint8Array<ArrayBuffer>) =>
      crypto.subtle.verify({ name: 'ECDSA', hash: 'SHA-256' }, key, signature, data);
    expect(await verify(body)).toBe(true);
    expect(await verify(new TextEncoder().encode('{"device":"t-2"}'))).toBe(false);
  });

  it('keeps its key when it is refused, and says so', async () => {
    const { server } = coreForSpecs();
    const tablet = TestBed.inject(Tablet);
    const refused = tablet.register();
    const first = await asked(server, 'POST', '/api/tablets');
    first.flush({}, { status: 403, statusText: 'Forbidden' });
    expect(await refused).toBe('refused');
    expect(tablet.id()).toBeUndefined();

    const registered = tablet.register();
    const second = await asked(server, 'POST', '/api/tablets');
    expect(second.request.body.publicKey).toEqual(first.request.body.publicKey);
    second.flush({ id: 't-1', label: 'x' });
    expect(await registered).toBe('registered');
  });
});
