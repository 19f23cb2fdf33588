import { generateKeyPairSync, sign, type KeyObject } from 'node:crypto';
import type { RunEvent, RunHeader } from '../../procedures/engine';
import type { Answered, DemoName, TestServer } from './test-server';

/** What a push holds. */
export interface Pushed {
  readonly runs?: readonly { readonly header: RunHeader | object; readonly events: readonly (RunEvent | object)[] }[];
  readonly documents?: readonly { readonly kind: string; readonly document: object }[];
}

/** A tablet with its key, as the app on it would push. */
export class TestTablet {
  private constructor(
    private readonly server: TestServer,
    readonly id: string,
    private readonly key: KeyObject,
  ) {}

  static async enrol(server: TestServer, label = 'B2'): Promise<TestTablet> {
    const { publicKey, privateKey } = generateKeyPairSync('ec', { namedCurve: 'P-256' });
    const answer = await server.ask('POST', '/api/tablets', {
      as: 'adeyemi',
      json: { label, publicKey: { ...publicKey.export({ format: 'jwk' }), ext: true, key_ops: ['verify'] } },
    });
    if (answer.status !== 201) throw new Error(`not enrolled: ${answer.bytes.toString('utf8')}`);
    return new TestTablet(server, (answer.json as { id: string }).id, privateKey);
  }

  push(pushed: Pushed, options: { readonly as?: DemoName; readonly device?: string } = {}): Promise<Answered> {
    const { runs = [], documents = [] } = pushed;
    const body = Buffer.from(JSON.stringify({ device: options.device ?? this.id, runs, documents }));
    return this.pushBytes(body, this.signature(body), options.as);
  }

  pushBytes(body: Buffer, signature: string, as: DemoName = 'okafor'): Promise<Answered> {
    return this.server.ask('POST', '/api/sync/push', {
      as,
      bytes: body,
      headers: { 'content-type': 'application/json', 'x-bayhand-signature': signature },
    });
  }

  signature(body: Buffer): string {
    return sign('sha256', body, { key: this.key, dsaEncoding: 'ieee-p1363' }).toString('base64url');
  }
}
