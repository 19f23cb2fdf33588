import { hexDigits, isWholeCode, mayFollow, typeCode } from './code-text';

const typed = (keys: string): string => [...keys].reduce(typeCode, '');

describe('typeCode', () => {
  it('takes a letter, a first digit up to 3, and three hexadecimal digits', () => {
    expect(typed('P0068')).toBe('P0068');
    expect(typed('U3FFF')).toBe('U3FFF');
  });

  it('takes a keyboard\u2019s small letters', () => {
    expect(typed('p0a1f')).toBe('P0A1F');
  });

  it('does not begin with a digit, nor go on with a first digit over 3', () => {
    expect(typed('0')).toBe('');
    expect(typed('P9')).toBe('P');
  });

  it('takes no sixth character', () => {
    expect(typed('P00680')).toBe('P0068');
  });
});

describe('mayFollow', () => {
  it('lets letters beyond F through nowhere', () => {
    expect(mayFollow('P00', 'G')).toBe(false);
  });
});

describe('isWholeCode', () => {
  it('is so at five characters', () => {
    expect(isWholeCode('P006')).toBe(false);
    expect(isWholeCode('P0068')).toBe(true);
  });
});

describe('hexDigits', () => {
  it('has each of the sixteen once', () => {
    expect([...hexDigits].sort().join('')).toBe('0123456789ABCDEF');
  });
});
