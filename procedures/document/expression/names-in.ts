import { stationPressureName, type Expression } from './expression';

/** The direct parts of a node. */
export function partsOf(node: Expression): readonly Expression[] {
  switch (node.node) {
    case 'number':
    case 'name':
    case 'about':
      return [];
    case 'negate':
    case 'not':
      return [node.of];
    case 'arithmetic':
    case 'comparison':
    case 'logic':
      return [node.left, node.right];
    case 'call':
      return node.arguments;
  }
}

/**
 * The names that an expression reads, each once, in the order of the text; those asked about in `inBand(name)` and the
 * air of the place behind `absolute(...)` and `gauge(...)` are among them.
 */
export function namesIn(expression: Expression): readonly string[] {
  const names = new Set<string>();
  const visit = (node: Expression): void => {
    if (node.node === 'name' || node.node === 'about') names.add(node.name);
    partsOf(node).forEach(visit);
    if (node.node === 'call' && (node.calls === 'absolute' || node.calls === 'gauge')) names.add(stationPressureName);
  };
  visit(expression);
  return [...names];
}
