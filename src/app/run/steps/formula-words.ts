import { shownUnit } from '../../../../procedures/engine/showing';
import type { RunView } from '../run-view';

/** One piece of a formula: a name with the value that stands for it, or whatever stands between the names. */
export type FormulaPart =
  | { readonly kind: 'text'; readonly text: string }
  | { readonly kind: 'value'; readonly name: string; readonly label: string; readonly value: string | undefined };

/** A formula in its pieces, the run's own numbers put in. A value that was never measured stays undefined. */
export function formulaParts(
  { procedure, state }: Pick<RunView, 'procedure' | 'state'>,
  source: string,
): readonly FormulaPart[] {
  const names = new Set(procedure.expression(source).names);
  return source.split(/([A-Za-z][A-Za-z0-9]*)/).flatMap((text): readonly FormulaPart[] => {
    if (text === '') return [];
    if (!names.has(text)) return [{ kind: 'text', text: withRealSigns(text) }];
    const label = procedure.declared(text)?.label ?? text;
    const known = state.values[text] ?? state.inputs[text];
    const value = known === undefined ? undefined : `${known.text} ${shownUnit(known.unit)}`.trim();
    return [{ kind: 'value', name: text, label, value }];
  });
}

const signs: Readonly<Record<string, string>> = {
  '-': '\u2212',
  '*': '\u00d7',
  '/': '\u00f7',
  '<=': '\u2264',
  '>=': '\u2265',
};

const withRealSigns = (text: string): string => text.replace(/<=|>=|[-*/]/g, (sign) => signs[sign] ?? sign);
