// Lets a plain `node -r` run the server's sources, so that a spec which needs a process of its own needs no build. What
// was translated once is kept under the hash of its source, since the compiler alone takes seconds.
const { createHash } = require('node:crypto');
const { existsSync, mkdirSync, readFileSync, renameSync, writeFileSync } = require('node:fs');
const { tmpdir } = require('node:os');
const { join } = require('node:path');
const { version } = require('typescript/package.json');

const kept = join(tmpdir(), `bayhand-translated-${process.getuid?.() ?? 0}`);
mkdirSync(kept, { recursive: true, mode: 0o700 });

require.extensions['.ts'] = (module, path) => {
  const source = readFileSync(path, 'utf8');
  const name = createHash('sha256').update(`${version}\0${path}\0${source}`).digest('hex');
  const file = join(kept, `${name}.js`);
  if (!existsSync(file)) {
    const half = `${file}.${process.pid}`;
    writeFileSync(half, translated(path, source));
    renameSync(half, file);
  }
  module._compile(readFileSync(file, 'utf8'), path);
};

function translated(path, source) {
  const ts = require('typescript');
  return ts.transpileModule(source, {
    fileName: path,
    compilerOptions: {
      module: ts.ModuleKind.CommonJS,
      target: ts.ScriptTarget.ES2022,
      esModuleInterop: true,
      experimentalDecorators: true,
      emitDecoratorMetadata: true,
      importHelpers: true,
    },
  }).outputText;
}
