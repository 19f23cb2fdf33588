import { stepWords, type LintFinding, type LintSubject } from './lint-finding';

/** Pictures whose sheet the procedure does not name, or whose marked parts the drawing does not have. */
export function missingParts({ document, parts }: LintSubject): readonly LintFinding[] {
  const drawn = (sheet: string): readonly string[] | undefined =>
    parts !== undefined && Object.hasOwn(parts, sheet) ? parts[sheet] : undefined;
  const unknownSheets = document.pictures.flatMap((sheet, place): LintFinding[] => {
    if (parts === undefined || drawn(sheet) !== undefined) return [];
    const message = `The picture ${sheet} is not drawn. Drawn are: ${Object.keys(parts).join(', ')}.`;
    return [{ rule: 'picture-parts', pointer: `/pictures/${place}`, message }];
  });
  const inSteps = document.steps.flatMap((step, place): LintFinding[] => {
    const { picture } = step;
    if (picture === undefined) return [];
    const at = { rule: 'picture-parts', step: step.id, pointer: `/steps/${place}/picture` } as const;
    if (!document.pictures.includes(picture.sheet)) {
      return [{ ...at, message: `${stepWords(step)}: shows ${picture.sheet}, which \`pictures\` does not name.` }];
    }
    const sheet = drawn(picture.sheet);
    if (sheet === undefined) return [];
    const wanted = new Set([...picture.marks, ...Object.keys(picture.labels ?? {})]);
    return [...wanted].flatMap((part): LintFinding[] =>
      sheet.includes(part)
        ? []
        : [
            {
              ...at,
              message: `${stepWords(step)}: marks ${part}, which ${picture.sheet} does not have. It has: ${sheet.join(', ')}.`,
            },
          ],
    );
  });
  return [...unknownSheets, ...inSteps];
}
