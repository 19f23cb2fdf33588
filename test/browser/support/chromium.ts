/** Where Debian's package puts it. Nothing is downloaded. */
export const chromiumPath = '/usr/bin/chromium';

/** Runs as root in a container without a graphics card, and asks nothing of the network beyond the product. */
export const chromiumSwitches: readonly string[] = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
  '--no-first-run',
];
