import { ClockWatch } from './clock-watch';

function watched(backMs = 0) {
  const time = { wall: 1_700_000_000_000, monotonic: 500 };
  const watch = new ClockWatch(
    () => time.wall,
    () => time.monotonic,
  );
  watch.begin(backMs);
  return { time, watch };
}

describe('ClockWatch', () => {
  it('says nothing while both clocks go on alike', () => {
    const { time, watch } = watched();
    time.wall += 3_600_000;
    time.monotonic += 3_600_000;
    expect(watch.drafts()).toEqual([]);
  });

  it('notes a clock that was set back by three hours, once', () => {
    const { time, watch } = watched();
    time.wall += 1000 - 3 * 3_600_000;
    time.monotonic += 1000;
    expect(watch.drafts()).toEqual([{ type: 'clock-jumped', data: { byMs: -10_800_000 } }]);
    expect(watch.drafts()).toEqual([]);
  });

  it('lets the small corrections of network time pass', () => {
    const { time, watch } = watched();
    time.wall += 119_000;
    expect(watch.drafts()).toEqual([]);
  });

  it('notes what was set back while the app was closed', () => {
    expect(watched(7_200_000).watch.drafts()).toEqual([{ type: 'clock-jumped', data: { byMs: -7_200_000 } }]);
  });
});
