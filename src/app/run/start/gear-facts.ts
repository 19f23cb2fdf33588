import { convert, unitKind } from '../../../../procedures/calculations/for-a-run';
import type { GearNeed } from '../../../../procedures/document';
import { coarseness, isOverdue } from '../../../../procedures/engine';
import { shownUnit, type InstrumentSnapshot } from '../../../../procedures/engine/showing';
import { daysUntil } from '../../core/time-words';
import type { GearItem } from '../../core/wire';

/** An instrument as a choice for one role: what it shows, until when its check holds, what speaks against it. */
export interface GearFacts {
  readonly item: GearItem;
  readonly instrument: InstrumentSnapshot;
  /** `0 to 60 kPa, steps of 0.1`; absent for gear that shows no number. */
  readonly shows: string | undefined;
  readonly due: string;
  readonly isOverdue: boolean;
  /** Its steps against the ones that are needed, with the arithmetic; absent when they are fine enough. */
  readonly coarse: string | undefined;
}

/** The site's instruments of the kind that is needed: sound ones first, then coarse ones, then overdue ones. */
export function gearFor(need: GearNeed, gear: readonly GearItem[], now: number): readonly GearFacts[] {
  return gear
    .filter(({ kind, inUse }) => kind === need.kind && inUse)
    .map((item) => factsOf(need, item, now))
    .sort((a, b) => weight(a) - weight(b) || a.item.label.localeCompare(b.item.label));
}

function factsOf(need: GearNeed, item: GearItem, now: number): GearFacts {
  const { id, kind, label, shows, dueOn } = item;
  const unit = need.shows?.unit;
  const range = unit === undefined ? undefined : shows.find((candidate) => unitKind(candidate.unit) === unitKind(unit));
  return {
    item,
    instrument: { id, kind, label, shows, dueOn },
    shows:
      range === undefined
        ? undefined
        : `${range.low} to ${range.high} ${shownUnit(range.unit)}, steps of ${range.resolution}`,
    due: dueWords(dueOn, now),
    isOverdue: isOverdue(item, now),
    coarse: coarseness(need, item) === undefined ? undefined : coarseWords(need, item),
  };
}

/** `Steps of 1 kPa where 0.2 kPa are needed: 5 times too coarse. Near a band's edge it will be too close to call.` */
function coarseWords(need: GearNeed, { shows }: GearItem): string | undefined {
  const needed = need.shows;
  if (needed === undefined) return undefined;
  const range = shows.find((candidate) => unitKind(candidate.unit) === unitKind(needed.unit));
  if (range === undefined) return undefined;
  const step = convert(range.resolution, range.unit, needed.unit) - convert(0, range.unit, needed.unit);
  const unit = shownUnit(needed.unit);
  const times = Number((step / needed.resolution).toPrecision(2));
  const shown = Number(step.toPrecision(3));
  return `Steps of ${shown} ${unit} where ${needed.resolution} ${unit} are needed: ${shown} \u00f7 ${needed.resolution} = ${times} times too coarse. Near a band's edge it will be too close to call.`;
}

function dueWords(dueOn: string, now: number): string {
  const days = daysUntil(dueOn, now);
  if (days < 0) return days === -1 ? 'check overdue since yesterday' : `check overdue by ${-days} days`;
  if (days === 0) return 'check holds until today';
  return days <= 30 ? `check holds ${days} more ${days === 1 ? 'day' : 'days'}` : `check holds until ${dueOn}`;
}

const weight = ({ isOverdue: isLate, coarse }: GearFacts): number => (isLate ? 2 : 0) + (coarse === undefined ? 0 : 1);
