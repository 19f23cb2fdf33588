/** What a key of the pedal, or of a keyboard used as one, does. */
export type PedalAct = 'primary' | 'look-back';

/**
 * PageDown does the primary action and PageUp looks back, always. Enter and Space do the primary action only when no
 * control has the focus: there they are the control's own.
 */
export function pedalAct(key: string, focused: Element | null): PedalAct | undefined {
  switch (key) {
    case 'PageDown':
      return 'primary';
    case 'PageUp':
      return 'look-back';
    case 'Enter':
    case ' ':
      return isControl(focused) ? undefined : 'primary';
    default:
      return undefined;
  }
}

function isControl(element: Element | null): boolean {
  return (
    element !== null && element.matches('button, a, input, select, textarea, summary, [tabindex]:not([tabindex="-1"])')
  );
}
