import { DOCUMENT, inject, InjectionToken } from '@angular/core';
import { version } from '../../../package.json';

/**
 * Which build of the app this is, as every event carries it: the package's version and the hash that the bundler gave
 * the main script, `0.1.0+QZ4K7R2M`. Where no such script is loaded (specs, the development server) it ends in `dev`.
 */
export const buildId = new InjectionToken<string>('buildId', {
  factory: () => {
    const script = inject(DOCUMENT).querySelector<HTMLScriptElement>('script[src*="main-"]');
    const hash = /main-([A-Za-z0-9]+)\.js/.exec(script?.src ?? '')?.[1] ?? 'dev';
    return `${version}+${hash}`;
  },
});
