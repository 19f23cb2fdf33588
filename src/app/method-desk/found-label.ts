import type { Found } from '../../../procedures/document';

/** What a listen step looks for, as people call it. */
export function foundLabel(found: Found): string {
  if ('unit' in found) return found.label;
  return found.what === 'noise-heard' ? 'a noise was heard' : 'the noise stopped';
}
