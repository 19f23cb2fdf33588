// Jest runs CommonJS, and the start's modules (*.mjs) are plain ECMAScript: nothing but the module form is changed here.
const ts = require('typescript');

exports.process = (source, path) => {
  const { outputText } = ts.transpileModule(source, {
    // Under its own ending the compiler would leave the module form alone.
    fileName: path.replace(/\.mjs$/, '.js'),
    compilerOptions: {
      module: ts.ModuleKind.CommonJS,
      target: ts.ScriptTarget.ES2022,
      inlineSourceMap: true,
      inlineSources: true,
    },
  });
  return { code: outputText };
};
