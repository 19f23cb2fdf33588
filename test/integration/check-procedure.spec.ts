import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { crankcaseValveSeal } from '../../procedures/library';

const root = join(__dirname, '..', '..');
const libraryFile = join(root, 'procedures', 'library', 'crankcase-valve-seal.json');

describe('npm run check-procedure', () => {
  let folder: string;
  beforeAll(() => (folder = mkdtempSync(join(tmpdir(), 'bayhand-check-'))));
  afterAll(() => rmSync(folder, { recursive: true }));

  const kept = (name: string, content: string | Uint8Array): string => {
    const path = join(folder, name);
    writeFileSync(path, content);
    return path;
  };
  const check = (...files: readonly string[]) => {
    const given = { cwd: root, encoding: 'utf8' as const, timeout: 60_000 };
    const { status, stdout, stderr } = spawnSync('npm', ['run', '--silent', 'check-procedure', ...files], given);
    return { status, stdout, stderr };
  };

  it("finds the library's procedure fit to be published, and shows a way to each finding", () => {
    const { status, stdout, stderr } = check(libraryFile);
    expect([status, stderr]).toEqual([0, '']);
    const steps = crankcaseValveSeal.steps.length;
    expect(stdout).toContain(`Crankcase valve seal under regulated pressure, ${steps} steps`);
    expect(stdout).toContain('It can be published: 0 problems, 0 warnings.');
    expect(stdout).toContain('  F12, Not completed\n     1 2d 2e F12\n');
    const findings = crankcaseValveSeal.steps.filter(({ kind }) => kind === 'finding');
    for (const { number, title } of findings) expect(stdout).toContain(`  ${number}, ${title}\n     1 `);
  });

  it('refuses a broken one: the step, what is wrong and how to mend it, and the place', () => {
    const document = structuredClone(crankcaseValveSeal) as unknown as { steps: Record<string, unknown>[] };
    const place = document.steps.findIndex(({ id }) => id === 'notCompleted');
    document.steps.splice(place, 0, { ...document.steps[place]!, id: 'lonely', number: 'F99', title: 'Lonely' });
    const at = document.steps.findIndex(({ number }) => number === '2i');
    document.steps[at]!['next'] = [{ when: 'manifoldPressure > 1 V', to: 'nowhere', because: 'it is so' }];
    const { status, stdout, stderr } = check(kept('broken.json', JSON.stringify(document)));
    expect([status, stderr]).toEqual([1, '']);
    expect(stdout).toMatch(/^Publishing would be refused: [1-9]\d* problems, 0 warnings\.$/m);
    expect(stdout).toMatch(/^ +1\. Step 2i, branch 1: .*cannot be compared.*\n +at \/steps\/\d+\/next\/0\/when$/m);
    expect(stdout).toMatch(/^ +\d\. Step 2i, branch 1: leads to `nowhere`, and no step is called that\.$/m);
    expect(stdout).toContain('  F99, Lonely\n     No way leads there.\n');
  });

  it('refuses what is no procedure by its shape', () => {
    const { status, stdout } = check(kept('other.json', '{ "title": "Shopping" }'));
    expect(status).toBe(1);
    expect(stdout).toContain('  1. The procedure: `format` is missing.');
  });

  it('says in one sentence why nothing can be checked', () => {
    const refusals: readonly [files: readonly string[], sentence: RegExp][] = [
      [[], /^Name one procedure file: npm run check-procedure FILE\.json\n$/],
      [[libraryFile, libraryFile], /^Name one procedure file/],
      [[join(folder, 'missing.json')], /missing\.json does not exist\. [^\n]+\n$/],
      [[folder], / is a folder\. [^\n]+\n$/],
      [
        [kept('cut.json', '{\n  "format": 1,\n  "id"')],
        / is not JSON: at line 3, column 7 there should be a colon\.\n$/,
      ],
      [[kept('list.json', '[]')], / is JSON, but no procedure: [^\n]+\n$/],
      [[kept('latin.json', Uint8Array.of(0x22, 0xe4, 0x22))], / is not UTF-8 text\. [^\n]+\n$/],
      [[kept('huge.json', ' '.repeat(2 * 1024 * 1024 + 1))], / has more than 2 MB, [^\n]+\n$/],
    ];
    for (const [files, sentence] of refusals) {
      const { status, stdout, stderr } = check(...files);
      expect({ status, stdout, stderr }).toEqual({ status: 2, stdout: '', stderr: expect.stringMatching(sentence) });
    }
  }, 60_000);
});
