import { unbroken } from './unbroken';

describe('unbroken', () => {
  it.each([
    ['seals at 3.4 \u00b1 0.3 kPa above', 'seals at 3.4\u00a0\u00b1\u00a00.3\u00a0kPa above'],
    ['held for 30 s at 10 kPa', 'held for 30\u00a0s at 10\u00a0kPa'],
    ['version 1 shows', 'version 1 shows'],
  ])('%j', (text, expected) => {
    expect(unbroken(text)).toBe(expected);
  });
});
