import { crankcaseValveSeal } from '../../../procedures/library';
import { groupFindings } from './known-findings';

describe('the findings to choose from', () => {
  const version = (number: number, title: string, findings: readonly string[]) => ({
    id: 'crankcase-valve-seal',
    version: number,
    status: 'published' as const,
    contentHash: String(number),
    publishedAt: '2026-12-01T08:00:00Z',
    publishedBy: 'R. Adeyemi',
    document: {
      ...crankcaseValveSeal,
      title,
      steps: crankcaseValveSeal.steps.filter(({ kind, id }) => kind !== 'finding' || findings.includes(id)),
    },
  });

  it('are those of the newest version, and what only an older one had', () => {
    const groups = groupFindings([
      version(1, 'Valve seal', ['seals', 'doesNotSeal']),
      version(2, 'Crankcase valve seal', ['seals', 'sealsOutsideBand']),
    ]);
    expect(groups).toEqual([
      {
        procedure: 'Crankcase valve seal',
        findings: [
          { id: 'seals', title: 'Seals' },
          { id: 'sealsOutsideBand', title: 'Seals outside the band' },
          { id: 'doesNotSeal', title: 'Does not seal' },
        ],
      },
    ]);
  });
});
