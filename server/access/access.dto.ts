import { IsIn, IsInt, IsOptional, IsString, IsUUID, MaxLength, MinLength } from 'class-validator';
import { PlainText } from '../http/plain-text';
import { everyRole, type Role } from '../http/route';
import { Nested } from '../http/validated';

export class SignInRequest {
  @PlainText({ min: 1, max: 100 })
  declare name: string;

  @IsString()
  @MinLength(1)
  @MaxLength(1000)
  declare password: string;

  /** The enrolled tablet that the session stays bound to. */
  @IsOptional()
  @IsUUID()
  declare tablet?: string;
}

export class RefreshRequest {
  /** The tablet that was named when signing in. */
  @IsOptional()
  @IsUUID()
  declare tablet?: string;
}

export class SessionPerson {
  @IsUUID()
  declare id: string;

  @IsString()
  declare name: string;

  @IsString()
  declare displayName: string;

  @IsIn(everyRole)
  declare role: Role;

  @IsUUID()
  declare siteId: string;
}

export class SessionAnswer {
  @IsString()
  declare accessToken: string;

  @IsInt()
  declare expiresInS: number;

  @Nested(() => SessionPerson)
  declare person: SessionPerson;
}

/** A public P-256 key as a JSON Web Key (RFC 7517, 7518). Other members, as WebCrypto exports them, are let through. */
export class PublicKeyJwk {
  @IsIn(['EC'])
  declare kty: 'EC';

  @IsIn(['P-256'])
  declare crv: 'P-256';

  @IsString()
  @MaxLength(43)
  @MinLength(43)
  declare x: string;

  @IsString()
  @MaxLength(43)
  @MinLength(43)
  declare y: string;

  @IsOptional()
  declare ext?: boolean;

  @IsOptional()
  @IsString({ each: true })
  declare key_ops?: string[];

  @IsOptional()
  @IsString()
  @MaxLength(20)
  declare alg?: string;
}

export class TabletRequest {
  @PlainText({ min: 1, max: 60 })
  declare label: string;

  @Nested(() => PublicKeyJwk)
  declare publicKey: PublicKeyJwk;
}

export class TabletAnswer {
  @IsUUID()
  declare id: string;

  @IsString()
  declare label: string;
}
