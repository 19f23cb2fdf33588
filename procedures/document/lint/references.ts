import { channelNames } from './channel-names';
import { valueNamesOf } from './named-values';
import { stepWords, type LintFinding, type LintSubject } from './lint-finding';
import { wayName, waysOf } from './ways';
import type { ProcedureDocument, Step } from '../procedure-document';
import { channelsOf, placedReadsOf, readsOf } from '../step-parts';

/** Ids, roles and names that lead nowhere, or that two parts share. */
export function brokenReferences({ document }: LintSubject): readonly LintFinding[] {
  return [
    ...sharedIds(document),
    ...danglingWays(document),
    ...missingGear(document),
    ...unknownNames(document),
    ...endlessValidity(document),
  ];
}

function sharedIds(document: ProcedureDocument): readonly LintFinding[] {
  const findings: LintFinding[] = [];
  const once = (what: string, values: readonly string[], pointer: string): void => {
    const seen = new Set<string>();
    for (const value of values) {
      if (seen.has(value)) {
        findings.push({
          rule: 'references',
          pointer,
          message: `Two ${what} are called ${value}: give one of them another.`,
        });
      }
      seen.add(value);
    }
  };
  once(
    'steps',
    document.steps.map(({ id }) => id),
    '/steps',
  );
  once(
    'step numbers',
    document.steps.map(({ number }) => number),
    '/steps',
  );
  once(
    'roles of gear',
    document.gear.map(({ role }) => role),
    '/gear',
  );
  once(
    'inputs',
    document.inputs.map(({ name }) => name),
    '/inputs',
  );
  once(
    'limits',
    document.limits.map(({ id }) => id),
    '/limits',
  );
  if (document.steps.some(({ id }) => id === 'verdict')) {
    const message = 'A step is called verdict, which means the finding that the run heads for: give it another id.';
    findings.push({ rule: 'references', step: 'verdict', pointer: '/steps', message });
  }
  return findings;
}

function danglingWays(document: ProcedureDocument): readonly LintFinding[] {
  const steps = new Map(document.steps.map((step) => [step.id, step]));
  const stop: LintFinding[] = [];
  const findings = document.steps.flatMap((step, place) =>
    waysOf(document, place).flatMap((way): LintFinding[] => {
      const { to, verdict } = way.exit;
      const where = way.kind === 'stop' ? 'The stop sheet' : `${stepWords(step)}, ${wayName(way)}`;
      const wrong: string[] = [];
      if (to !== 'verdict' && !steps.has(to)) wrong.push(`${where}: leads to \`${to}\`, and no step is called that.`);
      if (verdict !== undefined && steps.get(verdict)?.kind !== 'finding') {
        wrong.push(`${where}: heads for \`${verdict}\`, and no finding is called that.`);
      }
      const found = wrong.map((message): LintFinding => {
        const at = way.kind === 'stop' ? {} : { step: step.id };
        return { rule: 'references', ...at, pointer: way.pointer, message };
      });
      if (way.kind !== 'stop') return found;
      if (stop.length === 0) stop.push(...found);
      return [];
    }),
  );
  return [...findings, ...stop];
}

function missingGear(document: ProcedureDocument): readonly LintFinding[] {
  const roles = new Set(document.gear.map(({ role }) => role));
  return document.steps.flatMap((step, place) =>
    gearOf(step).flatMap((role): LintFinding[] => {
      if (roles.has(role)) return [];
      const message = `${stepWords(step)}: uses gear \`${role}\`, which the procedure does not name. Add it to \`gear\`.`;
      return [{ rule: 'references', step: step.id, pointer: `/steps/${place}`, message }];
    }),
  );
}

function gearOf(step: Step): readonly string[] {
  return [
    ...channelsOf(step).flatMap(({ gear }) => gear ?? []),
    ...readsOf(step).flatMap(({ gear, ways }) => [
      ...(gear === undefined ? [] : [gear]),
      ...(ways ?? []).flatMap(({ entry }) => entry?.gear ?? []),
    ]),
  ];
}

/** A reading cannot end with a step that is not there. */
function endlessValidity(document: ProcedureDocument): readonly LintFinding[] {
  const steps = new Set(document.steps.map(({ id }) => id));
  return document.steps.flatMap((step, place) =>
    placedReadsOf(step).flatMap(({ part, pointer }) =>
      (part.validity?.until ?? []).flatMap((id): LintFinding[] => {
        if (steps.has(id)) return [];
        const message = `${stepWords(step)}: ${part.name} holds until \`${id}\`, and no step is called that.`;
        return [{ rule: 'references', step: step.id, pointer: `/steps/${place}/${pointer}/validity`, message }];
      }),
    ),
  );
}

function unknownNames(document: ProcedureDocument): readonly LintFinding[] {
  const pressures = new Set([...channelNames, ...document.steps.flatMap(valueNamesOf)]);
  const limits = document.limits.flatMap((limit, place) =>
    limit.of.flatMap((name): LintFinding[] => {
      if (pressures.has(name)) return [];
      const message = `Limit ${limit.id}: is held against \`${name}\`, and no quantity or channel is called that.`;
      return [{ rule: 'references', pointer: `/limits/${place}/of`, message }];
    }),
  );
  const codes = new Set(document.steps.flatMap((step) => (step.kind === 'codes' ? [step.name] : [])));
  const comparisons = document.steps.flatMap((step, place): LintFinding[] => {
    if (step.kind !== 'codes') return [];
    const at = { rule: 'references', step: step.id, pointer: `/steps/${place}` } as const;
    if (step.comparedWith !== undefined && !codes.has(step.comparedWith)) {
      return [
        {
          ...at,
          message: `${stepWords(step)}: compares with \`${step.comparedWith}\`, and no codes step has that name.`,
        },
      ];
    }
    if (step.newCodes === undefined || step.comparedWith !== undefined) return [];
    return [{ ...at, message: `${stepWords(step)}: \`newCodes\` needs \`comparedWith\`: name the codes step before.` }];
  });
  return [...limits, ...comparisons];
}
