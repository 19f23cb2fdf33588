// jsdom lacks what every browser has and the offline store needs: give it Node's own.
const { default: JsdomEnvironment } = require('jest-preset-angular/environments/jest-jsdom-env');
const { webcrypto } = require('node:crypto');

module.exports = class BrowserLikeEnvironment extends JsdomEnvironment {
  async setup() {
    await super.setup();
    this.global.structuredClone = structuredClone;
    this.global.TextEncoder = TextEncoder;
    this.global.TextDecoder = TextDecoder;
    this.global.Uint8Array = Uint8Array;
    this.global.CompressionStream = CompressionStream;
    this.global.DecompressionStream = DecompressionStream;
    this.global.Response = Response;
    Object.defineProperty(this.global, 'crypto', { value: webcrypto, configurable: true });
  }
};
