import { expressionPlaces, type ExpressionPlace } from '../expression-places';
import { declarationsOf } from '../declarations';
import { namesIn } from '../expression/names-in';
import type { Step } from '../procedure-document';
import { KnownValues, type Moment } from './known-values';
import { stepWords, wayWords, type LintFinding, type LintSubject } from './lint-finding';
import { namesInTemplate, visitNames } from './named-values';
import type { RunPlace } from './run-graph';
import { isStop, wayWithout } from './way-without';
import { wayName } from './ways';

/**
 * Names that are used where, on some way, nothing has given them a value yet. Truths are false until they are set and
 * are not meant; nor are the sentences of a write-up, which are left out where a value is missing.
 */
export function valuesBeforeUse(subject: LintSubject): readonly LintFinding[] {
  const findings = new Map<string, LintFinding>();
  const uses = usesByStep(subject);
  const texts = new TemplateUses(subject);
  for (const graph of subject.graphs) {
    const known = new KnownValues(graph, subject);
    for (const place of graph.places.filter((candidate) => known.isReached(candidate))) {
      for (const use of [...(uses.get(place.step.id) ?? []), ...texts.at(place)]) {
        for (const name of missingFor(use, place, known, subject)) {
          const key = `${use.pointer} ${name}`;
          if (!findings.has(key)) findings.set(key, finding(use, name, place, wayWithout(graph, place, name, isStop)));
        }
      }
    }
  }
  return [...findings.values()];
}

interface Use {
  readonly where: string;
  readonly pointer: string;
  /** When the names have to be known: as the step is claimed, with its readings, with its results. */
  readonly when: Moment;
  readonly names: readonly string[];
  /** A condition may be settled without the name; text of a tree. */
  readonly condition?: string;
}

function usesByStep(subject: LintSubject): ReadonlyMap<string, readonly Use[]> {
  const quantities = new Set(
    [...declarationsOf(subject.document).declarations.values()].flatMap(({ kind, name }) =>
      kind === 'quantity' ? name : [],
    ),
  );
  const uses = new Map<string, Use[]>();
  for (const place of expressionPlaces(subject.document)) {
    const tree = subject.trees.get(place.source);
    if (place.step === undefined || tree === undefined || isSentence(place)) continue;
    const use: Use = {
      where: place.where,
      pointer: place.pointer,
      when: isBranch(place) ? 'at-ways' : 'within',
      names: namesIn(tree).filter((name) => quantities.has(name)),
      ...(place.gives.is === 'truth' ? { condition: place.source } : {}),
    };
    uses.set(place.step, [...(uses.get(place.step) ?? []), use]);
  }
  return uses;
}

const isSentence = ({ pointer }: ExpressionPlace): boolean => /\/(cause|correction|customer)\/\d+\/when$/.test(pointer);
const isBranch = ({ pointer }: ExpressionPlace): boolean => /\/next\/\d+\/when$/.test(pointer);

/** The reasons of the ways that the run can take here, and a finding's verdict; a step's id stands for its title. */
class TemplateUses {
  private readonly titles: ReadonlySet<string>;
  private readonly byPointer = new Map<string, Use>();

  constructor({ document }: LintSubject) {
    this.titles = new Set(document.steps.map(({ id }) => id));
  }

  at({ step, place, out }: RunPlace): readonly Use[] {
    if (step.kind === 'finding') {
      const pointer = `/steps/${place}/verdict`;
      return [this.use(pointer, () => ({ where: 'the verdict', when: 'before' }), step.verdict)];
    }
    return out
      .filter(({ way }) => way.kind !== 'stop')
      .map(({ way }) => {
        const at = (): Pick<Use, 'where' | 'when'> => ({ where: `the reason of ${wayName(way)}`, when: 'at-ways' });
        return this.use(`${way.pointer}/because`, at, way.exit.because);
      })
      .filter(({ names }) => names.length > 0);
  }

  /** A step is come to heading for many findings, and its texts are the same. */
  private use(pointer: string, at: () => Pick<Use, 'where' | 'when'>, template: string): Use {
    const known = this.byPointer.get(pointer);
    if (known !== undefined) return known;
    const names = namesInTemplate(template).filter((name) => !visitNames.includes(name) && !this.titles.has(name));
    const use: Use = { ...at(), pointer, names };
    this.byPointer.set(pointer, use);
    return use;
  }
}

function missingFor(use: Use, place: RunPlace, known: KnownValues, { trees }: LintSubject): readonly string[] {
  const tree = use.condition === undefined ? undefined : trees.get(use.condition);
  return use.names.filter((name) => {
    if (known.knows(name, place, use.when)) return false;
    return tree === undefined || known.truthWithout(tree, name, place) === 'missing';
  });
}

function finding({ where, pointer }: Use, name: string, { step }: RunPlace, way: readonly Step[]): LintFinding {
  const message = `${stepWords(step)}, ${where}: uses \`${name}\`, which has no value yet on the way ${wayWords(way)}. Give it one before, or ask measured(${name}) first.`;
  return { rule: 'value-before-use', step: step.id, pointer, message };
}
