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
  const found = causes.find(({ signs }) => signs.test(output));
  if (found) return `${what}: ${found.told(place)}`;
  const said = output
    .split('\n')
    .filter((line) => /FATAL|PANIC|error:/.test(line))
    .at(-1);
  return `${what}: ${said?.trim() ?? lastLines(output, 5)}\nIf it can't be mended, move ${place} away to begin with an empty database.`;
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
    signs: /is not a valid data directory|not a database cluster directory|directory ".*" does not exist/,
    told: (place) =>
      `its folder is damaged. Put ${place} back from a copy, or move it away to begin with an empty one.`,
  },
  {
    signs:
      /could not (open|read|access|locate|find)[^\n]*(No such file|checkpoint|control file)|incorrect checksum in control file|invalid (primary )?checkpoint|contains unrecognized|invalid page/,
    told: (place) =>
      `its files are damaged. Put ${place} back from a copy, or move it away to begin with an empty one.`,
  },
  {
    signs: /database files are incompatible with server|initialized by PostgreSQL version/,
    told: (place) =>
      `its files belong to another version of PostgreSQL. Install that version, or move ${place} away to begin with an empty database.`,
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
