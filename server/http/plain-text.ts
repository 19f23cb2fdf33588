import { Matches, MaxLength, MinLength } from 'class-validator';

/** One line of text without control characters (PostgreSQL's text can not hold all of them). */
export function PlainText(lengths: { readonly min: number; readonly max: number }): PropertyDecorator {
  return (target, property) => {
    MinLength(lengths.min)(target, property);
    MaxLength(lengths.max)(target, property);
    Matches(/^\P{Cc}*$/u, { message: '$property must be one line of plain text' })(target, property);
  };
}

/** Takes out what PostgreSQL's text can not hold: for columns that only repeat what an event says. */
export function withoutNul(text: string): string {
  return text.replaceAll('\u0000', '');
}
