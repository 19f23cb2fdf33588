import type { CompiledProcedure } from '../../document';
import { applyEvent, contentHash, decide, headerHash, openRun, sealEvent } from '..';
import type { EventDraft, OpeningFacts, Outcome, RunCommand, RunEvent, RunHeader, RunState } from '..';

/** The opening facts of the invented car that specs use. */
export const openingFacts: OpeningFacts = {
  visit: {
    repairOrder: '4417',
    vin: '1ZZBT4CK4LR204817',
    car: 'Merrow Heron 1.6 turbo, silver',
    odometer: { text: '84210', unit: 'km' },
    concern: 'Whistle at idle, hesitates under load',
    codes: ['P0068'],
  },
  siteName: 'Ossenholt',
  person: 'I. Okafor',
  elevationM: '640',
  displacementL: '1.6',
};

/** Walks a run for a spec: commands go in, sealed events and the state come out, with counted ids and clock. */
export class RunWalk {
  readonly header: RunHeader;
  readonly events: RunEvent[] = [];
  state: RunState;
  private laterMs = 0;

  constructor(
    readonly procedure: CompiledProcedure,
    header: Partial<RunHeader> = {},
    facts: OpeningFacts = openingFacts,
  ) {
    this.header = {
      runId: '0190a7f0-0000-7000-8000-000000000001',
      procedureId: procedure.document.id,
      version: 1,
      contentHash: contentHash(procedure.authored),
      visitId: '0190a7f0-0000-7000-8000-000000000002',
      siteId: 'ossenholt',
      kind: 'real',
      half: 'warm',
      ...header,
    };
    const opened = openRun(procedure, facts);
    if (!opened.ok) throw new Error(opened.message);
    const first = opened.drafts.map((draft) => this.write(draft));
    const state = first.at(-1);
    if (state === undefined) throw new Error('nothing was opened');
    this.state = state;
  }

  /** What the command would give, nothing written. */
  ask(command: RunCommand): Outcome {
    return decide(this.procedure, this.state, command, this.timeOf(this.events.length + 1));
  }

  /** Does it, or throws the words that it was refused with. */
  do(...commands: readonly RunCommand[]): this {
    for (const command of commands) {
      const outcome = this.ask(command);
      if (!outcome.ok)
        throw new Error(`${command.do} at ${this.state.current?.id ?? 'the finding'}: ${outcome.message}`);
      for (const draft of outcome.drafts) this.state = this.write(draft);
    }
    return this;
  }

  /** Lets time go by. */
  later(minutes: number): this {
    this.laterMs += minutes * 60_000;
    return this;
  }

  /** Acknowledges every caution of the current step. */
  cautions(count: number): this {
    for (let caution = 0; caution < count; caution += 1) this.do({ do: 'acknowledge-caution', caution });
    return this;
  }

  private timeOf(seq: number): number {
    return 1_790_000_000_000 + seq * 1_000 + this.laterMs;
  }

  /** Writes what a shell would write beside commands. */
  write(draft: EventDraft): RunState {
    const seq = this.events.length + 1;
    const event = sealEvent(draft, {
      runId: this.header.runId,
      seq,
      id: `0190a7f0-0000-7000-8000-${String(seq).padStart(12, '0')}`,
      at: this.timeOf(seq),
      elapsed: seq * 1_000,
      actor: 'okafor',
      device: 'B2',
      build: 'spec',
      prev: this.events.at(-1)?.hash ?? headerHash(this.header),
    });
    this.events.push(event);
    const result = applyEvent(this.procedure, this.header, this.events.length === 1 ? undefined : this.state, event);
    if (!result.ok) throw new Error(`event ${result.refusal.seq} (${draft.type}) was refused: ${result.refusal.what}`);
    this.state = result.state;
    return result.state;
  }
}
