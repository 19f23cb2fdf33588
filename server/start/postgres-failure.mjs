// @ts-check
import { lastLines } from './sentences.mjs';

/**
 * Why PostgreSQL did not do what it was asked, as a sentence with the way out, read from what it printed (in the C
 * locale; the texts are those of PostgreSQL 15's sources).
 * @param {string} what what was tried, as `The database in .data/postgres does not start`
 * @param {string} output what the programs printed and logged
 * @param {string} place the folder that holds the cluster
 */
export function postgresFailure(what, output, place) {
  const lines = output.split('\n');
  const found = causes.find(({ signs }) => signs.test(output));
  const why =
    (found && lines.find((line) => found.signs.test(line))) ?? lines.findLast((line) => /ERROR|FATAL|PANIC/.test(line));
  const told = found?.told(place) ?? `if it can't be mended, move ${place} away to begin with an empty database.`;
  return `${what}: ${told} (PostgreSQL says: ${why?.trim() ?? lastLines(output, 3)})`;
}

/** @type {{ signs: RegExp, told: (place: string) => string }[]} */
const causes = [
  {
    signs: /No space left on device|Disk quota exceeded/,
    told: (place) => `the disk that holds ${place} is full. Make room, then run the same command again.`,
  },
  {
    signs: /lock file ".*" already exists|pre-existing shared memory block/,
    told: (place) => `another PostgreSQL already uses ${place}. Stop that one, then run the same command again.`,
  },
  {
    signs: /initialized by PostgreSQL version/,
    told: (place) =>
      `its files belong to another version of PostgreSQL. Install that version, or move ${place} away to begin with an empty database.`,
  },
  {
    signs:
      /is not a (valid data directory|database cluster directory)|directory ".*" does not exist|No such file or directory|incorrect checksum in control file|incompatible with server|valid checkpoint record|invalid page/,
    told: (place) =>
      `its files are damaged. Put ${place} back from a copy, or move it away to begin with an empty one.`,
  },
  {
    signs: /has wrong ownership|has invalid permissions|Permission denied|must be owned by/,
    told: (place) =>
      `the rights on ${place} don't fit the account that runs it. Run the same command as the account that made it.`,
  },
  {
    signs: /could not map anonymous shared memory|could not create shared memory|Cannot allocate memory/,
    told: () => `this machine has too little memory free. End another program, then run the same command again.`,
  },
  {
    signs: /could not bind|Address already in use|could not create any TCP\/IP sockets/,
    told: () =>
      `no port on 127.0.0.1 could be opened for it. Check that loopback is up, then run the same command again.`,
  },
];
