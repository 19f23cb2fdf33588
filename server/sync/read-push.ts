import { Invalid } from '../http/problem';
import { validated } from '../http/validated';
import { PushRequest } from './sync.dto';

const mostEvents = 20_000;

/**
 * A push as it was sent, checked. The events are held back from the DTO's check, which copies everything it looks at,
 * and are given as they came: each is checked where its run is taken in.
 */
export function readPush(sent: object): PushRequest {
  const { runs } = sent as { runs?: unknown };
  if (!Array.isArray(runs)) return validated(PushRequest, sent);
  const held: unknown[] = runs.map((run: unknown) => (run as { events?: unknown } | null)?.events);
  const checked = validated(PushRequest, {
    ...sent,
    runs: runs.map((run: unknown, index) => (Array.isArray(held[index]) ? { ...(run as object), events: [] } : run)),
  });
  checked.runs.forEach((run, index) => {
    run.events = eventsOf(held[index], index);
    run.header = (runs[index] as { header: object }).header;
  });
  return checked;
}

function eventsOf(held: unknown, run: number): object[] {
  const events = held as unknown[];
  const wrong = events.findIndex((event) => typeof event !== 'object' || event === null || Array.isArray(event));
  if (events.length <= mostEvents && wrong < 0) return events as object[];
  const pointer = wrong < 0 ? `/runs/${run}/events` : `/runs/${run}/events/${wrong}`;
  const detail = wrong < 0 ? `At most ${mostEvents} events go at once.` : 'An event is an object.';
  throw new Invalid('The push is not valid.', [{ pointer, detail }]);
}
