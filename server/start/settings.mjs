// @ts-check
import { accessSync, constants } from 'node:fs';
import { resolve } from 'node:path';
import { StartProblem } from './sentences.mjs';

/** The port that tablets know: what they store belongs to the address, so it never moves by itself. */
export const usualPort = 4310;

/**
 * How this start was asked to run.
 * @typedef {object} StartSettings
 * @property {string} host the address to listen on
 * @property {number} port
 * @property {{ certificate: string, key: string } | undefined} tls paths of PEM files
 * @property {boolean} isDemo whether the demo's garage and people are put into an empty database
 * @property {import('./own-database.mjs').DatabaseUrls | undefined} database a given one; undefined: our own
 * @property {string | undefined} tokenSecret a given one; undefined: the kept one
 */

/**
 * Reads the environment.
 * @param {NodeJS.ProcessEnv} env
 * @returns {StartSettings}
 */
export function startSettings(env) {
  return {
    host: env['BAYHAND_HOST'] || '127.0.0.1',
    port: portFrom(env['BAYHAND_PORT']),
    tls: tlsFrom(env['BAYHAND_TLS_CERT'], env['BAYHAND_TLS_KEY']),
    isDemo: env['BAYHAND_DEMO'] !== '0',
    database: databaseFrom(env['DATABASE_URL'], env['DATABASE_OWNER_URL']),
    tokenSecret: env['BAYHAND_TOKEN_SECRET'] || undefined,
  };
}

/**
 * Why this address can't be listened on, as a sentence with the way out.
 * @param {string} code the system's error code
 * @param {StartSettings} settings
 */
export function portProblem(code, { host, port }) {
  switch (code) {
    case 'EADDRINUSE':
      return `Port ${port} is taken by another program: end that program, or choose another port for good with BAYHAND_PORT (tablets keep their work under the address they know).`;
    case 'EACCES':
      return `This account may not listen on port ${port}: choose one above 1023 with BAYHAND_PORT.`;
    case 'EADDRNOTAVAIL':
    case 'ENOTFOUND':
    case 'EAI_AGAIN':
      return `This machine has no address ${host}: set BAYHAND_HOST to one that it has, or leave it out for 127.0.0.1.`;
    default:
      return `Port ${port} on ${host} can't be opened (${code}): choose another with BAYHAND_PORT and BAYHAND_HOST.`;
  }
}

/** @param {string | undefined} text */
function portFrom(text) {
  if (!text) return usualPort;
  const port = Number(text);
  if (/^\d+$/.test(text) && port >= 1 && port <= 65535) return port;
  throw new StartProblem(`BAYHAND_PORT is "${text}": set it to a whole number from 1 to 65535, or leave it out.`);
}

/**
 * @param {string | undefined} certificate
 * @param {string | undefined} key
 */
function tlsFrom(certificate, key) {
  if (!certificate && !key) return undefined;
  if (!certificate || !key) {
    throw new StartProblem('HTTPS needs both: set BAYHAND_TLS_CERT and BAYHAND_TLS_KEY to the two PEM files.');
  }
  for (const [name, path] of [
    ['BAYHAND_TLS_CERT', certificate],
    ['BAYHAND_TLS_KEY', key],
  ]) {
    try {
      accessSync(String(path), constants.R_OK);
    } catch {
      throw new StartProblem(
        `${name} names ${path}, which can't be read: set it to a PEM file that this account reads.`,
      );
    }
  }
  return { certificate: resolve(certificate), key: resolve(key) };
}

/**
 * @param {string | undefined} appUrl
 * @param {string | undefined} ownerUrl
 */
function databaseFrom(appUrl, ownerUrl) {
  if (!appUrl && !ownerUrl) return undefined;
  if (!ownerUrl) {
    throw new StartProblem(
      "DATABASE_URL is set and DATABASE_OWNER_URL is not: set DATABASE_OWNER_URL to the URL of the role that owns that database, for its migrations (the app's own role may not change tables).",
    );
  }
  if (!appUrl) {
    throw new StartProblem(
      "DATABASE_OWNER_URL is set and DATABASE_URL is not: set DATABASE_URL to the URL of the app's role in that database.",
    );
  }
  return { appUrl, ownerUrl };
}
