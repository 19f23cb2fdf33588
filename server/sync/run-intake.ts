import type { DataSource, EntityManager } from 'typeorm';
import { canonicalJson, type RunEvent, type RunHeader } from '../../procedures/engine';
import { validateRunEvent, type EventProblem } from '../../procedures/engine/validate-event';
import { noteChange } from '../database/change-log';
import { AppError } from '../http/problem';
import { validated } from '../http/validated';
import type { CompiledProcedures, PublishedVersion } from '../procedures/procedures.service';
import { publishedVersion } from '../procedures/procedures.service';
import { Site } from '../sites/sites.entity';
import { type Countersigner } from './countersigner';
import { mainBranch } from './event-place';
import { problemOfItem, runProblem } from './push-problem';
import { insertRun, updateRun } from './run-row';
import { RunRows } from './run-rows';
import { RunWalk, type PushFacts } from './run-walk';
import { RunHeaderDto, type PushedRun, type PushedRunAnswer, type PushProblem } from './sync.dto';

/** Takes the runs of pushes in, each in a transaction of its own, so that none harms another. */
export class RunIntake {
  constructor(
    private readonly database: DataSource,
    private readonly compiled: CompiledProcedures,
    private readonly countersigner: Countersigner,
    private readonly clock: () => Date,
    private readonly build: string,
  ) {}

  async take(pushed: PushedRun, facts: PushFacts): Promise<PushedRunAnswer> {
    const header = headerOf(pushed.header);
    if ('problem' in header) return nothingTaken(pushed, header.problem);
    if (header.kind === 'practice') {
      return nothingTaken(pushed, runProblem('practice', 'A practice run is no record: practice stays on the tablet.'));
    }
    const { events, problem } = soundEvents(pushed.events);
    if (events.length === 0) {
      return nothingTaken(pushed, problem ?? runProblem('malformed', 'A run without events is none.'));
    }
    const answer = await this.database.transaction((manager) => this.takeIn(manager, header, events, facts));
    const own = answer.problem;
    // The first event that is not sound was cut off with all after it; an earlier problem says more.
    return problem === undefined || (own !== undefined && own.code !== 'fork') ? answer : { ...answer, problem };
  }

  private async takeIn(
    manager: EntityManager,
    header: RunHeader,
    events: readonly RunEvent[],
    facts: PushFacts,
  ): Promise<PushedRunAnswer> {
    const nothing = (problem: PushProblem) => nothingTaken({ header, events: [] }, problem);
    const version = await publishedVersion(manager, this.compiled, header);
    if (version === undefined) {
      const which = `${header.procedureId}, version ${header.version}`;
      return nothing(runProblem('unknown-procedure', `${which} with the content that the run names is not here.`));
    }
    if (!(await manager.existsBy(Site, { id: header.siteId }))) {
      return nothing(runProblem('unknown-site', 'There is no such site.'));
    }
    const isNew = await insertRun(manager, header, version.title, this.clock());
    const rows = new RunRows(manager, header.runId);
    if ((await rows.lockedHeader()) !== canonicalJson(header)) {
      return nothing(runProblem('other-header', 'A run of this id is here with another header.'));
    }
    const walk = await this.walk(rows, version, header, events, facts);
    const at = this.clock();
    if (walk.refused !== undefined) {
      await rows.keepRefused(walk.refused.event, walk.refused.text, facts.tabletId, walk.refused.reason, at);
    }
    if (walk.branch === undefined && isNew) await rows.forgetEmpty();
    const isNews = walk.added.length > 0 && (await this.keep(manager, rows, version, walk, isNew, at));
    const answer = await this.answer(manager, rows, header, walk);
    if (isNews) await noteChange(manager, 'run', header.runId);
    return answer;
  }

  private async walk(
    rows: RunRows,
    version: PublishedVersion,
    header: RunHeader,
    events: readonly RunEvent[],
    facts: PushFacts,
  ): Promise<RunWalk> {
    const branches = await rows.branches();
    const seqs = events.map(({ seq }) => seq);
    const kept = branches.length === 0 ? [] : await rows.kept(branches, Math.min(...seqs) - 1, Math.max(...seqs));
    const walk = new RunWalk(version.procedure, header, rows, branches, kept, facts, this.build);
    await walk.through(events);
    return walk;
  }

  /** Gives whether other tablets should hear of it. */
  private async keep(
    manager: EntityManager,
    rows: RunRows,
    version: PublishedVersion,
    walk: RunWalk,
    isNew: boolean,
    at: Date,
  ): Promise<boolean> {
    await rows.insertEvents(walk.added, at);
    await rows.insertAttachments(walk.added);
    for (const [branch, state] of walk.states) {
      const ends = walk.ends(branch);
      if (ends === undefined) continue;
      const own = walk.added.filter((added) => added.branch === branch);
      await rows.putBranch(ends, state, this.build);
      await rows.insertDiscrepancies(branch, state, own, this.build, at);
      await this.countersigner.sign(manager, { runId: state.header.runId, branch, seq: ends.headSeq, head: ends.head });
    }
    const state = walk.states.get(mainBranch);
    if (state === undefined) return false;
    const events = walk.added.filter(({ branch }) => branch === mainBranch).map(({ event }) => event);
    return updateRun(manager, version.procedure, state, events, isNew);
  }

  private async answer(
    manager: EntityManager,
    rows: RunRows,
    header: RunHeader,
    walk: RunWalk,
  ): Promise<PushedRunAnswer> {
    const { branch } = walk;
    const countersigned =
      branch === undefined ? undefined : await this.countersigner.latest(manager, header.runId, branch);
    const problem =
      walk.problem ?? (branch === undefined || branch === mainBranch ? undefined : forkProblem(walk, branch));
    return {
      runId: header.runId,
      acceptedThrough: walk.acceptedThrough,
      missingAttachments: await rows.missingAttachments(),
      ...(countersigned === undefined ? {} : { countersigned }),
      ...(problem === undefined ? {} : { problem }),
    };
  }
}

function forkProblem(walk: RunWalk, branch: string): PushProblem {
  const seq = walk.ends(branch)?.fromSeq;
  return runProblem('fork', `From event ${seq} on the run goes on in two ways. Both are kept.`, seq);
}

function headerOf(sent: object): RunHeader | { readonly problem: PushProblem } {
  try {
    validated(RunHeaderDto, sent);
    return sent as RunHeader;
  } catch (error) {
    // A header that is none is this run's matter alone.
    if (error instanceof AppError) return { problem: problemOfItem(error) };
    throw error;
  }
}

function soundEvents(sent: readonly object[]): { events: readonly RunEvent[]; problem?: PushProblem } {
  const events: RunEvent[] = [];
  for (const event of sent) {
    const validation = validateRunEvent(event);
    if (!validation.ok) return { events, problem: malformed(event, validation.problems) };
    events.push(validation.event);
  }
  return { events };
}

function malformed(event: object, problems: readonly EventProblem[]): PushProblem {
  const { seq } = event as { seq?: unknown };
  const which = Number.isSafeInteger(seq) ? (seq as number) : undefined;
  const words = problems.map(({ pointer, message }) => `${pointer} ${message}`.trim()).join('; ');
  return runProblem('malformed', `event ${which ?? 'without a number'}: ${words}`, which);
}

function nothingTaken({ header }: Pick<PushedRun, 'header' | 'events'>, problem: PushProblem): PushedRunAnswer {
  const { runId } = header as { runId?: unknown };
  return { runId: typeof runId === 'string' ? runId : '', acceptedThrough: 0, missingAttachments: [], problem };
}
