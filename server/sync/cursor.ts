import { InvalidQuery } from '../http/problem';

/** How far a tablet has pulled, and in which life of the database. */
export interface Cursor {
  readonly epoch: string;
  readonly position: bigint;
}

export function cursorText({ epoch, position }: Cursor): string {
  return `${epoch}.${position}`;
}

/** Throws `InvalidQuery` for what is no cursor. */
export function parseCursor(text: string): Cursor {
  const [, epoch, position] = /^([0-9a-f]{1,64})\.(\d{1,18})$/.exec(text) ?? [];
  if (epoch === undefined || position === undefined) {
    const errors = [{ pointer: '/since', detail: 'This is no cursor of a pull.' }];
    throw new InvalidQuery('The cursor can not be read.', errors);
  }
  return { epoch, position: BigInt(position) };
}
