import { nothingWaiting, type SyncView } from '../core/sync-view';
import { syncWords } from './sync-words';

const at = new Date(2026, 11, 2, 10, 42).getTime();
const view: SyncView = {
  isReached: true,
  unreachedSince: undefined,
  lastSyncAt: at,
  waiting: nothingWaiting,
  progress: undefined,
  heldUpBy: undefined,
};
const offline = { isReached: false, unreachedSince: at };
const waiting = { ...nothingWaiting, runs: 1, events: 40, evidence: 1 };

describe('syncWords', () => {
  it.each<[string, string, Partial<SyncView>]>([
    ['All sent 10:42', 'quiet', {}],
    ['Offline since 10:42 · everything kept here', 'quiet', offline],
    ['Offline since 10:42 · 41 kept', 'quiet', { ...offline, waiting }],
    ['Synced 3 of 12', 'quiet', { progress: { done: 3, of: 12 } }],
    ['41 kept, to be sent', 'quiet', { waiting }],
    ['Sign in again to send · 41 kept', 'live', { waiting, heldUpBy: 'sign-in' }],
    ['Tablet not registered', 'live', { heldUpBy: 'tablet' }],
    ['2 refused by the server', 'out', { waiting: { ...waiting, refused: 2 } }],
    ['Not yet synced', 'quiet', { lastSyncAt: undefined }],
  ])('says "%s", %s', (text, tone, change) => {
    expect(syncWords({ ...view, ...change })).toEqual({ text, tone });
  });
});
