import type { CompiledProcedure } from '../../../procedures/document';
import { composeWriteUp, type WriteUp } from '../../../procedures/engine';
import { contentHash, type RunState } from '../../../procedures/engine/showing';
import type { RecordDetail } from './record-wire';
import type { Story } from './story-line';
import { tellStory } from './tell-story';

/** A record after it was replayed here, or why this build cannot replay it. */
export type RetoldRecord =
  | {
      readonly ok: true;
      readonly procedure: CompiledProcedure;
      readonly story: Story;
      readonly state: RunState;
      /** What the record itself gives as a write-up; absent before a finding. */
      readonly composed: WriteUp | undefined;
    }
  | { readonly ok: false; readonly why: string };

/**
 * Replays a record with the same core that wrote it. The compiler of the expressions is heavy and comes as a chunk of
 * its own.
 */
export async function retellRecord({
  header,
  events,
  procedure: published,
  called,
}: RecordDetail): Promise<RetoldRecord> {
  if (contentHash(published.document) !== header.contentHash) {
    return { ok: false, why: 'The procedure that came with the record is not the one that the run was opened on.' };
  }
  const { compileProcedure, libraryOf } = await import('../../../procedures/document');
  const compiled = compileProcedure(published.document, libraryOf(called));
  if (!compiled.ok) {
    const first = compiled.problems[0];
    return { ok: false, why: `This build cannot read the procedure: ${first?.message ?? 'its document is damaged'}` };
  }
  const { story, state } = tellStory(compiled.procedure, header, events);
  if (state === undefined) return { ok: false, why: story.brokenOff?.what ?? 'The record has no events yet.' };
  const composed = state.finding === undefined ? undefined : composeWriteUp(compiled.procedure, state);
  return { ok: true, procedure: compiled.procedure, story, state, composed };
}
