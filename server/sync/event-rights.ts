import type { RunEvent, RunEventType } from '../../procedures/engine';
import type { Role } from '../http/route';

const atTheCar: readonly Role[] = ['technician', 'lead'];
const atWork: readonly Role[] = ['technician', 'lead', 'manager'];
const leads: readonly Role[] = ['lead'];
const releasers: readonly Role[] = ['lead', 'manager'];

/**
 * Whose event of a real run each type may be. An apprentice practises only; a manager reads records and makes none, but
 * releases what waits for one; deciding about a new version is the lead's.
 */
const whoMay: Readonly<Record<RunEventType, readonly Role[]>> = {
  opened: atTheCar,
  'gear-chosen': atTheCar,
  'step-claimed': atTheCar,
  'step-done': atTheCar,
  'caution-acknowledged': atTheCar,
  'reading-recorded': atTheCar,
  'not-measurable': atTheCar,
  'not-applicable': atTheCar,
  predicted: atTheCar,
  'series-recorded': atTheCar,
  'mark-placed': atTheCar,
  'codes-recorded': atTheCar,
  'timer-started': atTheCar,
  'timer-ended': atTheCar,
  'choice-made': atTheCar,
  'photo-attached': atTheCar,
  'note-written': atWork,
  'margin-note-written': atTheCar,
  disturbed: atTheCar,
  restored: atTheCar,
  'branch-taken': atTheCar,
  'branch-overruled': atTheCar,
  'step-redone': atTheCar,
  undone: atTheCar,
  'lead-called': atTheCar,
  released: releasers,
  'set-aside': atTheCar,
  // A manager takes a run up that was set aside until a release.
  resumed: atWork,
  'handed-over': atTheCar,
  'limit-exceeded': atTheCar,
  'alert-raised': atTheCar,
  'alert-acknowledged': atTheCar,
  stopped: atTheCar,
  'version-notice-answered': leads,
  'finding-reached': atTheCar,
  'write-up-written': atTheCar,
  closed: atTheCar,
  verified: atTheCar,
  signed: atWork,
  amended: atWork,
  joined: atWork,
  'clock-jumped': atWork,
  transcribed: atWork,
};

/** Why this event of a real run may not be its actor's; undefined when it may. `role` is undefined for a person whom nobody knows. */
export function missingRight(event: RunEvent, role: Role | undefined): string | undefined {
  if (role === undefined) return `event ${event.seq} is by a person who has no account here`;
  if (role === 'apprentice') {
    return `event ${event.seq} (${event.type}) is by an apprentice: apprentices practise only, and make no real run`;
  }
  const isReview = event.type === 'signed' && event.data.meaning === 'reviewed';
  const mayDo = isReview ? (['lead', 'manager'] as const) : whoMay[event.type];
  if (!mayDo.some((allowed) => allowed === role)) {
    return `event ${event.seq} (${event.type}) is by a ${role}, whose it can not be`;
  }
  return event.type === 'released' && event.data.by !== role
    ? `event ${event.seq} (released) says that the ${event.data.by} released, and is by a ${role}`
    : undefined;
}
