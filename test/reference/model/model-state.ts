/** The result of a judged reading. */
export type ModelResult = 'in' | 'out' | 'too-close';

export interface ModelValue {
  readonly kpa: number;
  readonly step: string;
  /** Seconds that had gone by when it was taken. */
  readonly at: number;
  /** For a computed one: what it was computed from. */
  readonly from?: string;
  readonly result?: ModelResult;
  readonly stale?: boolean;
}

export interface ModelClaim {
  readonly step: string;
  readonly before: string | undefined;
  readonly way?: string;
  readonly isLeft?: boolean;
}

export interface ModelCurrent {
  readonly step: string;
  seen: number[];
  takes: Record<string, number[]>;
  timer: 'none' | 'running' | 'over' | 'unsure';
  isReleased: boolean;
  isVerified: boolean;
}

/** As much of a run as the rules in words need: kilopascals, seconds, names. */
export interface ModelState {
  status: 'open' | 'set-aside' | 'stopped' | 'closed';
  hasAlarm: boolean;
  current: ModelCurrent | undefined;
  values: Record<string, ModelValue>;
  truths: Record<string, { readonly holds: boolean; readonly step: string }>;
  /** Choices, codes and photos by name: the step that gave them. */
  given: Record<string, string>;
  codes: Record<string, readonly string[]>;
  series: Record<string, { readonly step: string; isKept: boolean; begins: boolean; stops: boolean }>;
  /** The latest first. */
  disturbed: { readonly item: string; readonly step: string }[];
  counts: Record<string, number>;
  walked: ModelClaim[];
  heading: string | undefined;
  finding: string | undefined;
  seconds: number;
}

export function begunAt(first: string): ModelState {
  return {
    status: 'open',
    hasAlarm: false,
    current: { step: first, seen: [], takes: {}, timer: 'none', isReleased: false, isVerified: false },
    values: {},
    truths: {},
    given: {},
    codes: {},
    series: {},
    disturbed: [],
    counts: {},
    walked: [{ step: first, before: undefined }],
    heading: undefined,
    finding: undefined,
    seconds: 0,
  };
}
