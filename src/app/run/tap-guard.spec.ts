import { TapGuard, tapGuardMs } from './tap-guard';

describe('TapGuard', () => {
  it('lets the first tap through', () => {
    expect(new TapGuard(() => 0).admit()).toBe(true);
  });

  it('refuses a second tap within the guard time, and admits one at its end', () => {
    let now = 1000;
    const guard = new TapGuard(() => now);
    guard.admit();
    now += tapGuardMs - 1;
    expect(guard.admit()).toBe(false);
    now += 1;
    expect(guard.admit()).toBe(true);
  });

  it('does not let refused taps lengthen the guard time', () => {
    let now = 0;
    const guard = new TapGuard(() => now);
    guard.admit();
    now = 300;
    guard.admit();
    now = 410;
    expect(guard.admit()).toBe(true);
  });
});
