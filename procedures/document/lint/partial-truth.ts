import type { Expression } from '../expression/expression';
import { namesIn } from '../expression/names-in';

/** What is known of a condition before any run: that it holds, fails, may do either, or needs what is missing. */
export type PartialTruth = 'holds' | 'fails' | 'open' | 'missing';

/** What is known of the names. */
export interface PartialKnowledge {
  /** A truth that is settled; undefined where it may be either. */
  readonly truth: (name: string) => boolean | undefined;
  /** Whether the name has no value here. */
  readonly isMissing: (name: string) => boolean;
}

/** Evaluates a condition as far as can be told, with the same logic as a run's: see `compileEvaluation`. */
export function partialTruth(node: Expression, known: PartialKnowledge): PartialTruth {
  switch (node.node) {
    case 'name':
      return fromKnown(known.truth(node.name));
    case 'not':
      return negated(partialTruth(node.of, known));
    case 'logic': {
      const sides: readonly PartialTruth[] = [partialTruth(node.left, known), partialTruth(node.right, known)];
      const deciding: PartialTruth = node.operator === 'and' ? 'fails' : 'holds';
      if (sides.includes(deciding)) return deciding;
      if (sides.includes('missing')) return 'missing';
      return sides.includes('open') ? 'open' : negated(deciding);
    }
    case 'about':
      if (!known.isMissing(node.name)) return 'open';
      return node.asks === 'measured' ? 'fails' : 'missing';
    default:
      return namesIn(node).some(known.isMissing) ? 'missing' : 'open';
  }
}

function fromKnown(holds: boolean | undefined): PartialTruth {
  if (holds === undefined) return 'open';
  return holds ? 'holds' : 'fails';
}

function negated(truth: PartialTruth): PartialTruth {
  if (truth === 'holds') return 'fails';
  return truth === 'fails' ? 'holds' : truth;
}
