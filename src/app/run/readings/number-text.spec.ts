import { padKeyOf, pressKey, shownFigure, type PadKey } from './number-text';

const typed = (...keys: PadKey[]): string => keys.reduce(pressKey, '');

describe('pressKey', () => {
  it('keeps the digits as they are typed, the last nought too', () => {
    expect(typed('1', '2', '.', '6', '0')).toBe('12.60');
  });

  it('puts a nought before a point that comes first', () => {
    expect(typed('.', '5')).toBe('0.5');
    expect(typed('-', '.', '5')).toBe('-0.5');
  });

  it('takes one point only', () => {
    expect(typed('1', '.', '2', '.', '3')).toBe('1.23');
  });

  it('puts the sign on and takes it off again, wherever the typing stands', () => {
    expect(typed('3', '-')).toBe('-3');
    expect(typed('3', '-', '-')).toBe('3');
  });

  it('lets a digit take the place of a lone nought', () => {
    expect(typed('0', '7')).toBe('7');
    expect(typed('-', '0', '7')).toBe('-7');
    expect(typed('0', '.', '0', '7')).toBe('0.07');
  });

  it('erases from the end, and nothing from nothing', () => {
    expect(typed('9', '4', 'erase')).toBe('9');
    expect(typed('erase')).toBe('');
  });

  it('takes no more than ten characters', () => {
    expect(typed('1', '2', '3', '4', '5', '6', '7', '8', '9', '0', '1', '-')).toBe('1234567890');
  });
});

describe('padKeyOf', () => {
  it.each([
    ['7', '7'],
    ['.', '.'],
    [',', '.'],
    ['-', '-'],
    ['Backspace', 'erase'],
  ])('takes %p of a keyboard as %p', (key, pad) => {
    expect(padKeyOf(key)).toBe(pad);
  });

  it.each(['a', 'e', 'E', 'Enter', ' ', 'F5', 'ArrowLeft', '+'])('has nothing for %p', (key) => {
    expect(padKeyOf(key)).toBeUndefined();
  });
});

describe('shownFigure', () => {
  it('shows a minus sign instead of a hyphen', () => {
    expect(shownFigure('-0.4')).toBe('\u22120.4');
  });
});
