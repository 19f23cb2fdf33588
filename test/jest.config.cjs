// Three projects: the core and the server need no DOM and no Angular; the app does.
const { createCjsPreset } = require('jest-preset-angular/presets');
const root = require('node:path').resolve(__dirname, '..');

const plain = {
  rootDir: root,
  testEnvironment: 'node',
  transform: {
    '^.+\\.mjs$': '<rootDir>/test/support/plain-modules.cjs',
    '^.+\\.ts$': ['ts-jest', { tsconfig: '<rootDir>/test/tsconfig.jest.json', diagnostics: false }],
  },
  moduleNameMapper: { '^(\\.{1,2}/.*)\\.js$': '$1' },
};

/** @type {import('jest').Config} */
module.exports = {
  rootDir: root,
  maxWorkers: 2,
  projects: [
    {
      ...plain,
      displayName: 'core',
      testMatch: ['<rootDir>/procedures/**/*.spec.ts', '<rootDir>/test/reference/**/*.spec.ts'],
    },
    {
      ...plain,
      displayName: 'server',
      testMatch: ['<rootDir>/server/**/*.spec.ts', '<rootDir>/test/integration/**/*.spec.ts'],
      setupFiles: ['reflect-metadata'],
      globalSetup: '<rootDir>/test/support/integration-begin.cjs',
      globalTeardown: '<rootDir>/test/support/integration-end.cjs',
    },
    {
      ...createCjsPreset({ tsconfig: '<rootDir>/src/tsconfig.spec.json' }),
      rootDir: root,
      displayName: 'app',
      testEnvironment: '<rootDir>/test/support/browser-like-environment.cjs',
      testMatch: ['<rootDir>/src/**/*.spec.ts'],
      setupFilesAfterEnv: ['<rootDir>/test/support/angular-setup.ts'],
    },
  ],
};
