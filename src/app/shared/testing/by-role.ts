/** What a person finds on a page by: roles and the words that name them. For specs. */

const implicitRoles: Readonly<Record<string, string>> = {
  link: 'a[href], [role="link"]',
  button: 'button, [role="button"]',
  textbox: 'input[type="text"], input[type="search"], input:not([type]), textarea, [role="textbox"]',
  combobox: 'select, [role="combobox"]',
  heading: 'h1, h2, h3, h4, [role="heading"]',
  row: 'tr, [role="row"]',
  alert: '[role="alert"]',
  status: '[role="status"]',
  listitem: 'li, [role="listitem"]',
  table: 'table, [role="grid"]',
  columnheader: 'th[scope="col"], [role="columnheader"]',
  list: 'ul, ol, [role="list"]',
  navigation: 'nav, [role="navigation"]',
  region: 'section[aria-label], section[aria-labelledby], [role="region"]',
  contentinfo: 'footer, [role="contentinfo"]',
  dialog: 'dialog, [role="dialog"]',
  img: '[role="img"]',
};

/** All elements with a role whose name holds the given words; any name where none are given. */
export function allByRole(root: ParentNode, role: string, words: string | RegExp = ''): HTMLElement[] {
  const selector = implicitRoles[role] ?? `[role="${role}"]`;
  return [...root.querySelectorAll<HTMLElement>(selector)].filter((element) => names(element, words));
}

/** The one element with a role and a name. Throws where there is none, or more than one. */
export function byRole(root: ParentNode, role: string, words: string | RegExp = ''): HTMLElement {
  const found = allByRole(root, role, words);
  const [first] = found;
  if (first === undefined || found.length > 1) {
    const there = allByRole(root, role).map(nameOf).join(' | ');
    throw new Error(`${found.length} of role ${role} named ${String(words)}; there are: ${there}`);
  }
  return first;
}

/** Everything that can be read there, blanks tidied. */
export function textOf(element: Element): string {
  return (element.textContent ?? '').replace(/\s+/g, ' ').trim();
}

function names(element: HTMLElement, words: string | RegExp): boolean {
  const name = nameOf(element);
  return typeof words === 'string' ? name.includes(words) : words.test(name);
}

function nameOf(element: HTMLElement): string {
  const label = element.getAttribute('aria-label') ?? labelOf(element);
  return label ?? textOf(element);
}

function labelOf(element: HTMLElement): string | undefined {
  const { id } = element;
  const label = id === '' ? null : element.ownerDocument.querySelector(`label[for="${id}"]`);
  return label === null ? undefined : textOf(label);
}
