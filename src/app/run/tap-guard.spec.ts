import { BounceGuard, bounceMs, TapGuard, tapGuardMs } from './tap-guard';

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

  it('lets points and marks of a ramp follow each other at once, but no decision after one', () => {
    let now = 0;
    const guard = new TapGuard(() => now);
    expect(guard.admit('ramp')).toBe(true);
    now = 1;
    expect(guard.admit('ramp')).toBe(true);
    expect(guard.admit('decision')).toBe(false);
    now = 1 + tapGuardMs;
    expect(guard.admit('decision')).toBe(true);
  });

  it('takes a point just after a decision for its bounce', () => {
    let now = 0;
    const guard = new TapGuard(() => now);
    guard.admit('decision');
    now = tapGuardMs - 1;
    expect(guard.admit('ramp')).toBe(false);
    now = tapGuardMs;
    expect(guard.admit('ramp')).toBe(true);
  });

  it('never holds a stop back, and takes what is tapped right after it for a bounce', () => {
    const guard = new TapGuard(() => 0);
    guard.admit('decision');
    expect(guard.admit('stop')).toBe(true);
    expect(guard.admit('decision')).toBe(false);
    expect(guard.admit('ramp')).toBe(false);
  });
});

describe('BounceGuard', () => {
  it('refuses the same control within its time, and no other control', () => {
    let now = 0;
    const guard = new BounceGuard(() => now);
    expect(guard.admit('+ 0.5')).toBe(true);
    expect(guard.admit('mark', bounceMs.mark)).toBe(true);
    now = bounceMs.key - 1;
    expect(guard.admit('+ 0.5')).toBe(false);
    now = bounceMs.key;
    expect(guard.admit('+ 0.5')).toBe(true);
    expect(guard.admit('mark', bounceMs.mark)).toBe(false);
    now = bounceMs.mark;
    expect(guard.admit('mark', bounceMs.mark)).toBe(true);
  });
});
