import { agree } from './packages.mjs';

const dexie = { version: '4.4.7', integrity: 'sha512-a' };
const otherMachine = { version: '1.0.0', integrity: 'sha512-b', optional: true };
const locked = { '': { version: '0.1.0' }, 'node_modules/dexie': dexie, 'node_modules/other-machine': otherMachine };

describe('agree', () => {
  it.each([
    ['all of it', true, { 'node_modules/dexie': dexie, 'node_modules/other-machine': otherMachine }],
    ['all but what is for other machines', true, { 'node_modules/dexie': dexie }],
    ['nothing', false, {}],
    ['another version', false, { 'node_modules/dexie': { ...dexie, version: '4.4.6' } }],
    ['other bytes of the same version', false, { 'node_modules/dexie': { ...dexie, integrity: 'sha512-c' } }],
    ['one that is not locked', false, { 'node_modules/dexie': dexie, 'node_modules/stray': dexie }],
  ])('with %s installed: %p', (_what, expected, installed) => {
    expect(agree(locked, installed)).toBe(expected);
  });
});
