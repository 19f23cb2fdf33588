import { ArrayMaxSize, IsArray, IsIn, IsInt, IsOptional, IsUUID, Matches, Max, Min } from 'class-validator';
import { PlainText } from '../http/plain-text';
import { Nested } from '../http/validated';

export class OdometerDto {
  /** The digits as they were typed. */
  @Matches(/^\d{1,7}(?:\.\d)?$/)
  declare text: string;

  @IsIn(['km', 'mi'])
  declare unit: 'km' | 'mi';
}

export class VisitedCarDto {
  @PlainText({ min: 1, max: 100 })
  declare make: string;

  @PlainText({ min: 1, max: 100 })
  declare model: string;

  @IsOptional()
  @PlainText({ min: 0, max: 100 })
  declare colour?: string;

  @IsOptional()
  @PlainText({ min: 0, max: 100 })
  declare engine?: string;

  /** Litres, the digits as they were typed. */
  @IsOptional()
  @Matches(/^\d{1,2}(?:\.\d{1,3})?$/)
  declare displacementL?: string;

  @IsOptional()
  @IsInt()
  @Min(1886)
  @Max(2200)
  declare year?: number;
}

/** One car, one repair order, one concern. */
export class VisitDto {
  @IsUUID()
  declare id: string;

  @IsUUID()
  declare siteId: string;

  @Matches(/^[A-Z0-9]{1,17}$/)
  declare vin: string;

  @IsOptional()
  @IsIn(['after a second look'])
  declare vinKept?: 'after a second look';

  @PlainText({ min: 1, max: 40 })
  declare repairOrder: string;

  @Nested(() => OdometerDto)
  declare odometer: OdometerDto;

  @Matches(/^[^\u0000]{0,4000}$/)
  declare concern: string;

  @IsArray()
  @ArrayMaxSize(50)
  @Matches(/^[A-Z0-9-]{1,12}$/, { each: true })
  declare codes: string[];

  @Nested(() => VisitedCarDto)
  declare car: VisitedCarDto;

  @IsUUID()
  declare openedBy: string;

  /** Milliseconds since 1970. */
  @IsInt()
  @Min(0)
  declare openedAt: number;

  /** Milliseconds since 1970; the later writer wins. */
  @IsInt()
  @Min(0)
  declare changedAt: number;
}
