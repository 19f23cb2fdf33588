import { declarationsOf, type Declaration } from '../declarations';
import { expandCalls } from '../call/expand-calls';
import type { CallStep, ProcedureDocument, TakenResult } from '../procedure-document';
import { stepWords, type LintFinding, type LintSubject } from './lint-finding';

/** What is known of a version that a step may call. */
export interface CalledVersion {
  readonly document: ProcedureDocument;
  readonly isWithdrawn: boolean;
}

/** A published version, withdrawn ones included; undefined where there is none. */
export type PublishedVersions = (id: string, version: number) => CalledVersion | undefined;

/** Calls of what is not published or was withdrawn, and results or findings that the called procedure does not have. */
export function unsoundCalls(subject: LintSubject): readonly LintFinding[] {
  const { document, published } = subject;
  if (published === undefined) return [];
  const findings = document.steps.flatMap((step, place) =>
    step.kind === 'call' ? callFindings(step, `/steps/${place}`, document, published) : [],
  );
  return findings.length > 0 ? findings : notToBeExpanded(document, published);
}

function callFindings(
  step: CallStep,
  pointer: string,
  document: ProcedureDocument,
  published: PublishedVersions,
): readonly LintFinding[] {
  const say = (field: string, message: string): LintFinding => ({
    rule: 'called',
    step: step.id,
    pointer: `${pointer}/${field}`,
    message: `${stepWords(step)}: ${message}`,
  });
  const name = `${step.procedure}, version ${step.version}`;
  const called = published(step.procedure, step.version);
  if (called === undefined) return [say('procedure', `calls ${name}, which is not published. Publish it first.`)];
  const findings: LintFinding[] = [];
  if (called.isWithdrawn) findings.push(say('version', `calls ${name}, which was withdrawn. Call a standing version.`));
  if (called.document.pair === true && document.pair !== true) {
    findings.push(say('procedure', `calls ${name}, which is run in halves, and this one is not. Set \`pair\`.`));
  }
  const { declarations } = declarationsOf(called.document);
  step.takes.forEach((taken, index) => {
    const problem = takenProblem(taken, declarations.get(taken.from));
    if (problem !== undefined) findings.push(say(`takes/${index}`, problem));
  });
  const ends = new Set(called.document.steps.flatMap(({ kind, id }) => (kind === 'finding' ? [id] : [])));
  step.finds.forEach(({ finding }, index) => {
    if (ends.has(finding)) return;
    findings.push(say(`finds/${index}`, `asks for the finding \`${finding}\`; ${name} has ${[...ends].join(', ')}.`));
  });
  return findings;
}

function takenProblem({ from, name, unit, sense }: TakenResult, there: Declaration | undefined): string | undefined {
  if (there?.kind !== 'quantity') return `takes \`${from}\`, and no quantity there is called that.`;
  if (there.unit === unit && there.sense === sense) return undefined;
  const kind = [there.unit, there.sense].filter((word) => word !== undefined).join(' ');
  return `takes \`${from}\` as \`${name}\` in another unit: there it is ${kind}. Give it the same.`;
}

/** Calls that come back to this procedure, or go too deep. */
function notToBeExpanded(document: ProcedureDocument, published: PublishedVersions): readonly LintFinding[] {
  const expansion = expandCalls(document, (id, version) => published(id, version)?.document);
  if (expansion.ok) return [];
  return expansion.problems.map(({ step, message }): LintFinding => {
    const place = document.steps.findIndex(({ id }) => id === step);
    return { rule: 'called', step, pointer: `/steps/${place}/procedure`, message };
  });
}
