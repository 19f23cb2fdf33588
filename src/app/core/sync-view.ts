/** Where sending stands, for people to see. */
export interface SyncView {
  /** Whether the server answered last time; undefined before the first try. */
  readonly isReached: boolean | undefined;
  /** Since when it has not answered, device clock, milliseconds. */
  readonly unreachedSince: number | undefined;
  /** When everything was last sent and fetched. */
  readonly lastSyncAt: number | undefined;
  /** What waits on this tablet. */
  readonly waiting: WaitingCounts;
  /** How far a sync under way has come. */
  readonly progress: { readonly done: number; readonly of: number } | undefined;
  /** Why nothing is sent although the server answers. */
  readonly heldUpBy: 'sign-in' | 'tablet' | undefined;
}

export interface WaitingCounts {
  readonly runs: number;
  readonly events: number;
  /** Photos and series. */
  readonly evidence: number;
  readonly documents: number;
  /** Items that the server refused for good. */
  readonly refused: number;
  /** Since when the oldest waits. */
  readonly oldestSince: number | undefined;
}

export const nothingWaiting: WaitingCounts = {
  runs: 0,
  events: 0,
  evidence: 0,
  documents: 0,
  refused: 0,
  oldestSince: undefined,
};
