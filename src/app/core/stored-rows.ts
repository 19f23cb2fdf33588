import type { FindingResult } from '../../../procedures/document';
import type { BegunAgain, RunHeader, RunState } from '../../../procedures/engine/showing';
import type { Countersignature, Person } from './wire';

/**
 * A run as the tablet lists it. The events are the truth; everything here but the header is a projection that the
 * same transaction writes as the events, so that the Bench needs no replay.
 */
export interface RunRow {
  readonly runId: string;
  readonly header: RunHeader;
  readonly visitId: string;
  /** Of the last event stored here. Written by the journal alone. */
  readonly seq: number;
  readonly head: string;
  /** When the last event was written, device clock, milliseconds. */
  readonly changedAt: number;
  /** The last event's monotonic time, so that a reload goes on from there. */
  readonly elapsed: number;
  /** The person who opened it. */
  readonly openedBy: string;
  /** What the Bench shows; absent until someone has summarised the run. */
  readonly summary: RunSummary | undefined;
}

/** What the Bench shows of a run without replaying it. */
export interface RunSummary {
  readonly procedureTitle: string;
  readonly status: RunState['status'];
  readonly car: string;
  readonly repairOrder: string;
  readonly codes: readonly string[];
  readonly concern: string;
  readonly personName: string;
  readonly openedAt: number;
  readonly current: { readonly number: string; readonly title: string; readonly action: string } | undefined;
  readonly walked: readonly { readonly label: string; readonly result?: FindingResult | 'not-measured' }[];
  readonly disturbed: readonly string[];
  /** Why and since when it is set aside or stopped. */
  readonly pause: { readonly at: number; readonly reason: string } | undefined;
  /** The verdict in words, once a finding is reached. */
  readonly verdict: string | undefined;
  readonly half: RunHeader['half'];
  /** Why it was begun beside others of its half. */
  readonly again?: BegunAgain;
}

/** Something that waits to be sent. Rows go only when the server's receipt is stored. */
export type OutboxRow = OutboxEvents | OutboxDocument | OutboxBlob;

interface OutboxBase {
  /** Made by the database. */
  readonly id?: number;
  /** Device clock, milliseconds. */
  readonly since: number;
  /** Why the server refused it for good; it stays, visible, and can be offered again. */
  readonly refused?: string;
}

/** Events `fromSeq` to `toSeq` of a run. */
export interface OutboxEvents extends OutboxBase {
  readonly kind: 'events';
  readonly runId: string;
  readonly fromSeq: number;
  readonly toSeq: number;
}

/** A document that was made or changed here; sent as it stands when it goes. */
export interface OutboxDocument extends OutboxBase {
  readonly kind: 'document';
  readonly documentKind: 'visit';
  readonly documentId: string;
  /** The document's `changedAt` when it was queued: a later change queues anew. */
  readonly changedAt: number;
}

/** Evidence that the server may lack. */
export interface OutboxBlob extends OutboxBase {
  readonly kind: 'blob';
  readonly sha256: string;
  readonly runId: string;
  readonly bytes: number;
}

/** Bytes by their own hash. */
export interface BlobRow {
  /** SHA-256 of the bytes as stored, hexadecimal. */
  readonly sha256: string;
  readonly bytes: Uint8Array;
  readonly mediaType: string;
  readonly runId: string;
}

/** The server's countersignature of a run's head, kept 30 days: after a restore the tablet offers the run again. */
export interface ReceiptRow {
  readonly runId: string;
  readonly acceptedThrough: number;
  readonly countersigned: Countersignature | undefined;
  /** Device clock, milliseconds. */
  readonly receivedAt: number;
  /** The server database's epoch at that time. */
  readonly epoch: string | undefined;
  /** What the server said about the run, such as that it has two tails; absent when it took it silently. */
  readonly problem?: string;
}

/** One named value: a setting of the tablet or of a person, a cursor, a draft of a form. */
export interface SettingRow {
  readonly key: string;
  readonly value: unknown;
}

/** The tablet's own key pair and its registration. The private key cannot be read out. */
export interface TabletKeyRow {
  readonly id: 'tablet';
  readonly publicKey: JsonWebKey;
  readonly privateKey: CryptoKey;
  /** Given by the server at enrolment; absent before. */
  readonly tabletId: string | undefined;
  readonly label: string | undefined;
}

/** Who last worked on this tablet: never a token. */
export interface RememberedPerson {
  readonly person: Person;
  /** Device clock, milliseconds. */
  readonly lastAt: number;
  /** The tablet's id that the session was opened with; a refresh must name the same. */
  readonly tablet: string | undefined;
}
