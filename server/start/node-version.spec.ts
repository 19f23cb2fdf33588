import { nodeVersionProblem } from './node-version.mjs';

describe('nodeVersionProblem', () => {
  it.each(['20.19.0', '20.20.2'])('accepts Node %s', (version) => {
    expect(nodeVersionProblem(version)).toBeUndefined();
  });

  it.each(['18.20.4', '20.18.3', '21.7.0', '22.12.0', '8.0.0'])('says what to do about Node %s', (version) => {
    expect(nodeVersionProblem(version)).toBe(
      `Bayhand runs on Node 20, from 20.19 on, and this is Node ${version}: install Node 20, check with "node --version", then run the same command again.`,
    );
  });
});
