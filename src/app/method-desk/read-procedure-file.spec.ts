import { readProcedureFile } from './read-procedure-file';

describe('a procedure file', () => {
  it('is read as JSON', () => {
    expect(readProcedureFile('{ "format": 1 }')).toEqual({ ok: true, document: { format: 1 } });
  });

  it('is refused with the line where it stops being JSON', () => {
    const read = readProcedureFile('{\n  "format": 1,\n  "id" "x"\n}');
    expect(read).toMatchObject({ ok: false, problem: { where: 'line 3' } });
  });

  it('is refused at its end when it is cut off', () => {
    expect(readProcedureFile('{ "format": 1')).toMatchObject({ ok: false });
  });

  it.each(['[]', '"text"', 'null', '12'])('is no procedure when it holds %s', (text) => {
    expect(readProcedureFile(text)).toMatchObject({
      ok: false,
      problem: { message: expect.stringContaining('no procedure') },
    });
  });

  it('is refused above 2 MB, with its size', () => {
    const read = readProcedureFile(`{"x":"${'a'.repeat(2 * 1024 * 1024)}"}`);
    expect(read).toMatchObject({ ok: false, problem: { message: expect.stringContaining('It has 2.0 MB') } });
  });
});
