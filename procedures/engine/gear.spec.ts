import { composeWriteUp } from '.';
import { RunWalk } from './testing/run-walk';
import { fineGauge, procedure, scanTool } from './testing/small-walks';

describe('an overdue instrument', () => {
  it('costs a reason, which stands in the write-up', () => {
    const overdue = { ...fineGauge, id: 'g-3', label: 'G-3', dueOn: '2026-01-01' };
    const walk = new RunWalk(procedure).cautions(1);
    expect(walk.ask({ do: 'choose-gear', role: 'gauge', instrument: overdue })).toMatchObject({
      ok: false,
      code: 'overdue',
    });
    walk.do(
      { do: 'choose-gear', role: 'gauge', instrument: overdue, overdueBecause: 'no other one is here' },
      { do: 'choose-gear', role: 'scanTool', instrument: scanTool },
      { do: 'confirm' },
    );
    const { correction } = composeWriteUp(procedure, walk.state);
    expect(correction.text).toContain(
      'with G-3 (its check ran out on 2026-01-01; used because: no other one is here), S-3.',
    );
  });
});
