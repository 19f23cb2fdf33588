import { In, type DataSource, type EntityManager } from 'typeorm';
import { SessionEnded, WrongNameOrPassword } from '../http/problem';
import type { Principal } from '../http/route';
import { Person } from './access.entity';
import { accessTokenSeconds, type AccessTokens } from './access-token';
import { countTry, forgetTries } from './lock-out';
import { isPassword } from './password';
import { RefreshTokens, type IssuedRefreshToken } from './refresh-tokens';

export interface SignedIn {
  readonly accessToken: string;
  readonly expiresInS: number;
  readonly person: Person;
  readonly refresh: IssuedRefreshToken;
}

/** Signing in, staying signed in, signing out. */
export class AccessService {
  private readonly refreshTokens: RefreshTokens;

  constructor(
    private readonly database: DataSource,
    private readonly accessTokens: AccessTokens,
    private readonly clock: () => Date,
  ) {
    this.refreshTokens = new RefreshTokens(database, clock);
  }

  /** Throws `WrongNameOrPassword` or `LockedOut`. */
  async signIn(given: { name: string; password: string; tablet?: string }): Promise<SignedIn> {
    const name = given.name.trim().toLowerCase();
    await countTry(this.database, name, this.clock());
    const person = await this.database.getRepository(Person).findOneBy({ name, isActive: true });
    if (!(await isPassword(given.password, person?.passwordHash)) || person === null) throw new WrongNameOrPassword();
    await forgetTries(this.database, name);
    const refresh = await this.refreshTokens.open(person.id, given.tablet);
    return this.signedIn(person, refresh);
  }

  /** Gives a new pair for a refresh token. Throws `SessionEnded`. */
  async refresh(token: string | undefined, tablet: string | undefined): Promise<SignedIn> {
    const { personId, issued } = await this.refreshTokens.rotate(token, tablet);
    const person = await this.database.getRepository(Person).findOneBy({ id: personId, isActive: true });
    if (person === null) throw new SessionEnded('The session has ended. Sign in again.');
    return this.signedIn(person, issued);
  }

  /** Ends the session that the token belongs to; nothing happens for any other. */
  async signOut(token: string | undefined): Promise<void> {
    await this.refreshTokens.end(token);
  }

  private signedIn(person: Person, refresh: IssuedRefreshToken): SignedIn {
    const accessToken = this.accessTokens.make(principalOf(person));
    return { accessToken, expiresInS: accessTokenSeconds, person, refresh };
  }
}

function principalOf(person: Person): Principal {
  return { personId: person.id, displayName: person.displayName, role: person.role, siteId: person.siteId };
}

/** What of a person is on every tablet. */
export type ColleagueOnTheWire = Readonly<Pick<Person, 'id' | 'displayName' | 'role'>>;

/** The people, or those of these ids. */
export async function peopleForPull(
  manager: EntityManager,
  ids?: readonly string[],
): Promise<readonly ColleagueOnTheWire[]> {
  const people = await manager.find(Person, {
    ...(ids === undefined ? {} : { where: { id: In(ids) } }),
    order: { name: 'ASC' },
  });
  return people.map(({ id, displayName, role }) => ({ id, displayName, role }));
}
