import { codeProblem, codesIn, codeWords } from './trouble-code-words';

describe('trouble codes', () => {
  it('takes several from one text, each once', () => {
    expect(codesIn(' p0068, P0171;p0068\nU0100 ')).toEqual(['P0068', 'P0171', 'U0100']);
  });

  it.each(['P0068', 'P2279', 'C0035', 'U3FFF'])('accepts %s', (code) => expect(codeProblem(code)).toBeUndefined());

  it.each(['P4068', 'X0068', 'P068', 'P00688', 'P00G8'])('refuses %s in words', (code) => {
    expect(codeProblem(code)).toBe(`${code} is no trouble code: a letter P, C, B or U and four digits, such as P0068.`);
  });

  it('describes generic codes and never guesses at what a maker defines', () => {
    expect(codeWords('P0171')).toBe('System too lean (bank 1)');
    expect(codeWords('P1234')).toBe("the maker's own: see their service information");
    expect(codeWords('P3490')).toBe('generic, no words for it here');
  });
});
