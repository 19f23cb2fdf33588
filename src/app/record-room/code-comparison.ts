import type { TroubleCodeEntry } from '../../../procedures/engine/showing';

/** One code in the readings before and after. */
export interface ComparedCode {
  readonly code: string;
  readonly before?: TroubleCodeEntry;
  readonly after?: TroubleCodeEntry;
  readonly change: 'new' | 'gone' | 'changed' | 'same';
}

/** Codes before and after, side by side: what is new first, then what changed, what stayed, what is gone. */
export function compareCodes(
  before: readonly TroubleCodeEntry[],
  after: readonly TroubleCodeEntry[],
): readonly ComparedCode[] {
  const codes = [...new Set([...before, ...after].map(({ code }) => code))].sort();
  const compared = codes.map((code) =>
    compare(
      code,
      before.find((entry) => entry.code === code),
      after.find((entry) => entry.code === code),
    ),
  );
  return order.flatMap((change) => compared.filter((entry) => entry.change === change));
}

const order: readonly ComparedCode['change'][] = ['new', 'changed', 'same', 'gone'];

function compare(
  code: string,
  before: TroubleCodeEntry | undefined,
  after: TroubleCodeEntry | undefined,
): ComparedCode {
  if (before === undefined) return { code, after, change: 'new' };
  if (after === undefined) return { code, before, change: 'gone' };
  return { code, before, after, change: before.status === after.status ? 'same' : 'changed' };
}
