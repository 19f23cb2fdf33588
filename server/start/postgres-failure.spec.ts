import { postgresFailure } from './postgres-failure.mjs';

describe('postgresFailure', () => {
  // Printed by PostgreSQL 15.18 when each was brought about by hand.
  it.each([
    [
      'FATAL:  could not extend file "base/1/2691": No space left on device\nPANIC:  cannot abort transaction 1',
      'the disk that holds /place is full. Make room',
    ],
    [
      'pg_ctl: directory "/place/cluster" is not a database cluster directory',
      'its files are damaged. Put /place back',
    ],
    ['FATAL:  required WAL directory "pg_wal" does not exist', 'its files are damaged. Put /place back'],
    ['PANIC:  could not locate a valid checkpoint record', 'its files are damaged. Put /place back'],
    ['but could not open file "global/pg_control": No such file or directory', 'its files are damaged.'],
    [
      'FATAL:  database files are incompatible with server\nDETAIL:  The cluster was initialized with PG_CONTROL_VERSION 18',
      'its files are damaged. Put /place back',
    ],
    [
      'FATAL:  database files are incompatible with server\nDETAIL:  The data directory was initialized by PostgreSQL version 14',
      'its files belong to another version of PostgreSQL. Install that version',
    ],
    ['FATAL:  data directory "/place/cluster" has invalid permissions', "the rights on /place don't fit the account"],
    [
      'pg_ctl: could not open PID file "/place/cluster/postmaster.pid": Permission denied',
      "the rights on /place don't",
    ],
    [
      'FATAL:  could not map anonymous shared memory: Cannot allocate memory',
      'this machine has too little memory free',
    ],
    [
      'LOG:  could not bind IPv4 address "127.0.0.1": Address already in use\nFATAL:  could not create any TCP/IP sockets',
      'no port on 127.0.0.1 could be opened for it',
    ],
    ['FATAL:  configuration file "postgresql.conf" contains errors', "if it can't be mended, move /place away"],
  ])('tells the way out of %p', (output, told) => {
    const sentence = postgresFailure('The database does not start', output, '/place');
    expect(sentence).toContain(`The database does not start: ${told}`);
  });

  it.each([
    [
      'the line that was understood',
      'FATAL:  required WAL directory "pg_wal" does not exist\nLOG:  aborting',
      /pg_wal/,
    ],
    ['else the last grave one', 'FATAL:  one\nFATAL:  two\nLOG:  database system is shut down', /FATAL: {2}two/],
    ['else the end', 'no reason given', /no reason given/],
  ])('quotes %s', (_what, output, quoted) => {
    const quote = /\(PostgreSQL says: (.*)\)$/.exec(postgresFailure('It', output, '/place'))?.[1];
    expect(quote).toMatch(quoted);
  });
});
