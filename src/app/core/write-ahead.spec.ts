import { TestBed } from '@angular/core/testing';
import { WriteAhead } from './write-ahead';

describe('what is being written', () => {
  const ahead = (): WriteAhead => TestBed.runInInjectionContext(() => new WriteAhead());
  afterEach(() => localStorage.clear());

  it('is found by the next page until the store has it', () => {
    ahead().put('draft', { vin: '1ZZ' });
    expect(ahead().left('draft')).toEqual({ value: { vin: '1ZZ' } });
    ahead().done('draft');
    expect(ahead().left('draft')).toBeUndefined();
  });

  it('tells what is to be forgotten from what is not there', () => {
    ahead().put('draft', undefined);
    expect(ahead().left('draft')).toEqual({});
    expect(ahead().left('other')).toBeUndefined();
  });

  it('is given up where there is no room: the store still gets it', () => {
    const full = jest.spyOn(Storage.prototype, 'setItem').mockImplementation(() => {
      throw new DOMException('full', 'QuotaExceededError');
    });
    expect(() => ahead().put('draft', 1)).not.toThrow();
    full.mockRestore();
  });
});
