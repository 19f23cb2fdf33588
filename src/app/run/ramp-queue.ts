import { Injectable, signal } from '@angular/core';
import type { RunCommand } from '../../../procedures/engine/showing';
import type { RunView } from './run-view';

/** What a person does while a ramp goes up: each belongs to its moment, and waits for no other to be written. */
const doneOnRamp: ReadonlySet<RunCommand['do']> = new Set(['record', 'take-back', 'mark', 'unmark']);

/** Whether the command is a point or a mark of the ramp that the run stands at. */
export function isOfRamp({ do: what }: RunCommand, { procedure, state }: RunView): boolean {
  const kind = state.current === undefined ? undefined : procedure.step(state.current.id)?.kind;
  return (kind === 'listen' || kind === 'ramp') && doneOnRamp.has(what);
}

/** The points and marks of a ramp that were tapped and are not written yet, in their order. */
@Injectable({ providedIn: 'root' })
export class RampQueue {
  private readonly tapped = signal<readonly RunCommand[]>([]);

  readonly commands = this.tapped.asReadonly();

  add(command: RunCommand): void {
    this.tapped.update((commands) => [...commands, command]);
  }

  remove(command: RunCommand): void {
    this.tapped.update((commands) => commands.filter((other) => other !== command));
  }
}
