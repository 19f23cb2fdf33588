import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { hashOfInputs } from './build-if-changed.mjs';

describe('hashOfInputs', () => {
  let root: string;
  beforeEach(() => {
    root = mkdtempSync(join(tmpdir(), 'bayhand-start-'));
    write('tsconfig.json', '{}');
    write('src/a.ts', 'a');
    write('src/deep/b.ts', 'b');
  });
  afterEach(() => rmSync(root, { recursive: true }));

  const write = (path: string, text: string) => {
    mkdirSync(dirname(join(root, path)), { recursive: true });
    writeFileSync(join(root, path), text);
  };
  const hash = () => hashOfInputs(root, ['tsconfig.json', 'src', 'not-there']);

  it('stays while nothing changes', async () => {
    const before = await hash();
    write('src/a.ts', 'a');
    expect(await hash()).toBe(before);
  });

  it.each([
    ['a content', () => write('src/deep/b.ts', 'c')],
    ['a new file', () => write('src/c.ts', '')],
    ['a lost file', () => rmSync(join(root, 'src/a.ts'))],
    ['text moved from one file to the next', () => (write('src/a.ts', ''), write('src/deep/b.ts', 'ab'))],
    ['a file given by its own name', () => write('tsconfig.json', '{ }')],
  ])('changes with %s', async (_what, change) => {
    const before = await hash();
    change();
    expect(await hash()).not.toBe(before);
  });

  it('leaves specs out: they are not built', async () => {
    const before = await hash();
    write('src/a.spec.ts', 'it()');
    expect(await hash()).toBe(before);
  });
});
