import type { ProcedureDocument } from '../procedure-document';

/** A text of a document that people read, and where it stands. */
export interface PlacedText {
  readonly text: string;
  /** The member that holds it: `action`, `because`, `text`, `notes`. */
  readonly field: string;
  /** JSON pointer (RFC 6901). */
  readonly pointer: string;
  /** The step's id. */
  readonly step?: string;
}

/** The members that hold words; every other text is a name, a unit, an expression or a source. */
const worded: ReadonlySet<string> = new Set([
  'title',
  'purpose',
  'action',
  'short',
  'notes',
  'why',
  'text',
  'because',
  'label',
  'hint',
  'meanwhile',
  'ask',
  'restore',
  'unjudged',
  'evidence',
  'shows',
  'says',
  'then',
  'verdict',
  'prerequisites',
  'stopActions',
  'makeSafe',
  'people',
]);

/** Every text of the start card, the limits, the stop sheet and the steps, in the document's order. */
export function documentTexts(document: ProcedureDocument): readonly PlacedText[] {
  const { start, limits, stop, steps, inputs } = document;
  return [
    ...textsOf(inputs, '/inputs', 'inputs'),
    ...textsOf(start, '/start', 'start'),
    ...textsOf(limits, '/limits', 'limits'),
    ...textsOf(stop, '/stop', 'stop'),
    ...steps.flatMap((step, index) =>
      textsOf(step, `/steps/${index}`, 'steps').map((placed): PlacedText => ({ ...placed, step: step.id })),
    ),
  ];
}

function textsOf(value: unknown, pointer: string, field: string): readonly PlacedText[] {
  if (typeof value === 'string') return worded.has(field) ? [{ text: value, field, pointer }] : [];
  if (Array.isArray(value)) return value.flatMap((item, index) => textsOf(item, `${pointer}/${index}`, field));
  if (typeof value !== 'object' || value === null) return [];
  return Object.entries(value).flatMap(([key, member]) => {
    // An exit's `verdict` is a finding's id; a finding's own is its words.
    if (key === 'verdict' && !('cause' in value)) return [];
    return textsOf(member, `${pointer}/${key.replaceAll('~', '~0').replaceAll('/', '~1')}`, key);
  });
}

/** Where a text stands, as a lead says it: `Step 11`, `Limit ceiling`, `The stop sheet`. */
export function textPlace(
  document: ProcedureDocument,
  { step, pointer }: Pick<PlacedText, 'step' | 'pointer'>,
): string {
  const [, part, index] = pointer.split('/');
  if (step !== undefined) return `Step ${document.steps[Number(index)]?.number ?? step}`;
  if (part === 'limits') return `Limit ${document.limits[Number(index)]?.id ?? ''}`;
  if (part === 'inputs') return `Input ${document.inputs[Number(index)]?.name ?? ''}`;
  return part === 'stop' ? 'The stop sheet' : 'The start card';
}
