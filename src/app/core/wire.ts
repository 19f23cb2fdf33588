import type { ProcedureDocument, InstrumentKind, FindingResult } from '../../../procedures/document';
import type { BegunAgain, InstrumentRange, RunState } from '../../../procedures/engine/showing';

/** What the server and the tablet say to each other, as JSON. */

export type Role = 'technician' | 'lead' | 'apprentice' | 'manager';

/** A person with an account. */
export interface Person {
  readonly id: string;
  /** The name they sign in with. */
  readonly name: string;
  /** As it stands in records: `I. Okafor`. */
  readonly displayName: string;
  readonly role: Role;
  readonly siteId: string;
}

/** The answer to signing in and to a refresh. */
export interface SessionAnswer {
  readonly accessToken: string;
  readonly expiresInS: number;
  readonly person: Person;
}

/** One version of a procedure as the server gives it. */
export interface PublishedProcedure {
  readonly id: string;
  readonly version: number;
  readonly status: 'published' | 'withdrawn';
  /** SHA-256 of the document's canonical JSON, hexadecimal. */
  readonly contentHash: string;
  /** ISO 8601. */
  readonly publishedAt: string;
  readonly publishedBy: string;
  readonly document: ProcedureDocument;
}

export interface Site {
  readonly id: string;
  readonly name: string;
  readonly elevationM: number;
}

/** One instrument of a site. */
export interface GearItem {
  readonly id: string;
  readonly siteId: string;
  readonly kind: InstrumentKind;
  /** As it is written on it: `G-12`. */
  readonly label: string;
  readonly serial: string;
  readonly shows: readonly InstrumentRange[];
  /** The day until which its check holds, `2026-12-10`. */
  readonly dueOn: string;
  readonly lastCheckedOn: string;
  readonly inUse: boolean;
}

/** What of a colleague is on every tablet. */
export interface Colleague {
  readonly id: string;
  readonly displayName: string;
  readonly role: Role;
}

/** One car, one repair order, one concern. Made on the tablet, offline too. */
export interface Visit {
  /** UUIDv7. */
  readonly id: string;
  readonly siteId: string;
  readonly vin: string;
  /** Why a VIN whose check digit does not fit was kept. */
  readonly vinKept?: 'after a second look';
  readonly repairOrder: string;
  /** The digits as they were typed, without blanks. */
  readonly odometer: { readonly text: string; readonly unit: 'km' | 'mi' };
  readonly concern: string;
  readonly codes: readonly string[];
  readonly car: VisitedCar;
  /** The person's id. */
  readonly openedBy: string;
  /** Milliseconds since 1970. */
  readonly openedAt: number;
  /** Milliseconds since 1970; the later writer wins. */
  readonly changedAt: number;
}

export interface VisitedCar {
  readonly make: string;
  readonly model: string;
  readonly colour?: string;
  readonly engine?: string;
  /** Litres, the digits as they were typed: `1.6`. */
  readonly displacementL?: string;
  readonly year?: number;
}

/** What every tablet is told of a run, whichever tablet has it. */
export interface VisitRun {
  readonly runId: string;
  readonly visitId: string;
  readonly procedureId: string;
  readonly procedureTitle: string;
  readonly half?: 'cold' | 'warm';
  readonly pairId?: string;
  /** Who began it. */
  readonly personName: string;
  /** What people call the tablet on which it was begun; absent when the server does not know it. */
  readonly tabletLabel?: string;
  /** That tablet's clock, milliseconds since 1970. */
  readonly openedAt: number;
  readonly status: RunState['status'];
  /** The finding in words. */
  readonly verdict?: string;
  readonly result?: FindingResult;
  /** Why it was begun beside others. */
  readonly again?: BegunAgain;
}

/** What a pull brings. Everything when it began without a cursor or the server's epoch is another. */
export interface PullAnswer {
  /** `epoch.position`. */
  readonly cursor: string;
  readonly procedures: readonly PublishedProcedure[];
  readonly sites: readonly Site[];
  readonly gear: readonly GearItem[];
  readonly people: readonly Colleague[];
  readonly visits: readonly Visit[];
  readonly runs: readonly VisitRun[];
  readonly notices: readonly unknown[];
}

/** The server's word that it holds a run up to an event. */
export interface Countersignature {
  readonly seq: number;
  /** The hash of the event with that seq. */
  readonly head: string;
  /** The server's time: milliseconds since 1970, or ISO 8601. */
  readonly at: number | string;
  readonly signature: string;
}

/** Why one item of a push was refused. */
export interface PushProblem {
  /** `gap`, `fork`, `not-allowed` and so on. */
  readonly code?: string;
  readonly status?: number;
  readonly title?: string;
  readonly detail?: string;
}

export interface PushAnswer {
  readonly runs: readonly {
    readonly runId: string;
    readonly acceptedThrough: number;
    readonly missingAttachments: readonly string[];
    readonly countersigned?: Countersignature;
    readonly problem?: PushProblem | string;
  }[];
  readonly documents: readonly {
    readonly kind: string;
    readonly id: string;
    readonly problem?: PushProblem | string;
  }[];
}
