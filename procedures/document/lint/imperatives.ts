import { nounLikeVerbs, objectWords, particlesOf, plainVerbs } from './imperative-verbs';

/** An instruction found in a text. */
export interface Imperative {
  readonly verb: string;
  /** Its words, from the verb to the end of the clause. */
  readonly words: string;
}

const leadIn = /^(?:(?:and|or|but|then|also|next|now|first|finally|please|always|just|again|afterwards)\b,?\s*)+/i;
const condition = /^(?:if|when|whenever|once|while|as soon as|where|after|before|until|unless|in case)\b/i;
const negative = /^(?:do not|don['\u2019]t|never)\s+/i;
/** Two verbs for one movement of the hand. */
const oneMovement = /^(press|push|pull|turn|squeeze|hold)\s+and\s+(?:hold|turn|pull|press|push|release)\b/i;
const clauseBreak = /\s*[,:\u2014]\s+|\s+(?=(?:and|then)\s)/i;

/** The sentences of a text: what ends in `.`, `!`, `?` or `;`. A decimal point ends none. */
export function sentencesOf(text: string): readonly string[] {
  return text
    .split(/(?<=[.!?;])\s+/)
    .map((sentence) => sentence.trim())
    .filter((sentence) => sentence !== '');
}

/** The instruction that a clause begins with; undefined where it states something. */
function imperativeOf(clause: string): Imperative | undefined {
  const words = clause
    .trim()
    .replace(leadIn, '')
    .replace(negative, '')
    .replace(/^[a-z]+ly\s+/i, '')
    .replace(/[.!?;]+$/, '');
  const [verb = '', next = ''] = words.toLowerCase().split(/\s+/);
  const isForbidden = /^(?:do not|don['\u2019]t)\s/i.test(clause.trim().replace(leadIn, ''));
  const isOne = isForbidden || plainVerbs.has(verb) || (nounLikeVerbs.has(verb) && instructs(verb, next));
  return isOne ? { verb, words } : undefined;
}

/** Whether a verb that may be a noun has an object, or the small word that goes with it. */
function instructs(verb: string, next: string): boolean {
  if (objectWords.has(next) || next.startsWith('{') || next.endsWith('ly')) return true;
  return (Object.hasOwn(particlesOf, verb) ? particlesOf[verb] : undefined)?.includes(next) ?? false;
}

function clausesOf(sentence: string): readonly string[] {
  const whole = sentence.trim().replace(leadIn, '');
  const main = condition.test(whole) ? whole.replace(/^[^,:]*(?:[,:]\s*|$)/, '') : whole;
  return main.replace(oneMovement, '$1').split(clauseBreak);
}

/**
 * The instructions of a sentence, in their order: what it begins with (a condition before it apart), and then what
 * follows `and`, `then` or a comma. A sentence that begins with a statement instructs only behind a colon.
 */
export function imperativesIn(sentence: string): readonly Imperative[] {
  const colon = sentence.indexOf(': ');
  const clauses = clausesOf(sentence);
  if (imperativeOf(clauses[0] ?? '') === undefined) {
    return colon < 0 ? [] : imperativesIn(sentence.slice(colon + 2));
  }
  return clauses.flatMap((clause) => imperativeOf(clause) ?? []);
}

/** The instructions of a sentence behind the one that it begins with, whatever verb that one has. */
export function furtherImperatives(sentence: string): readonly Imperative[] {
  return clausesOf(sentence)
    .slice(1)
    .flatMap((clause) => imperativeOf(clause) ?? [])
    .filter(({ words }) => /\s/.test(words));
}

/** Whether a sentence says under which condition it counts: `when the gauge nears it`, `until it is cold`. */
export function isConditional(sentence: string): boolean {
  return /\b(?:if|when|whenever|once|while|where|until|unless|before|as soon as|in case)\b/i.test(sentence);
}
