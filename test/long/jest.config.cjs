// What takes minutes: not part of npm test, but of npm run test:long.
const { projects } = require('../jest.config.cjs');
const core = projects.find(({ displayName }) => displayName === 'core');

/** @type {import('jest').Config} */
module.exports = {
  ...core,
  displayName: 'long',
  testMatch: ['<rootDir>/test/long/**/*.spec.ts'],
  testTimeout: 600_000,
};
