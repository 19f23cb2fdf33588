import type { ProcedureDocument } from '../../procedures/document';
import type { DocumentProblem, LintFinding, LintReport } from '../../procedures/document/authoring';

/** What the command prints for a file that is no procedure document: the places where its shape is wrong. */
export function shapeReport(file: string, problems: readonly DocumentProblem[]): string {
  return joined([
    `${file}\nPublishing would be refused: ${counted(problems.length, 'problem')}. The rest is checked when they are mended.`,
    listed('To mend', problems),
  ]);
}

/** What the command prints for a procedure document: problems, warnings, then one shortest way to each finding. */
export function lintReport(file: string, document: ProcedureDocument, report: LintReport): string {
  const { errors, warnings, waysToFindings } = report;
  const verdict = errors.length > 0 ? 'Publishing would be refused' : 'It can be published';
  const counts = `${counted(errors.length, 'problem')}, ${counted(warnings.length, 'warning')}`;
  return joined([
    `${file}: ${document.title}, ${counted(document.steps.length, 'step')}\n${verdict}: ${counts}.`,
    listed('To mend', errors),
    listed('To know', warnings),
    waysList(document, waysToFindings),
  ]);
}

function listed(title: string, findings: readonly Pick<LintFinding, 'message' | 'pointer'>[]): string {
  if (findings.length === 0) return '';
  const entries = findings.map(({ message, pointer }, index) => {
    const place = pointer === undefined || pointer === '' ? '' : `\n     at ${pointer}`;
    return `${String(index + 1).padStart(3)}. ${message}${place}`;
  });
  return [`${title}:`, ...entries].join('\n');
}

/** Steps by the numbers that people say; two steps of one number are among the problems. */
function waysList({ steps }: ProcedureDocument, ways: LintReport['waysToFindings']): string {
  const numbers = new Map(steps.map(({ id, number }) => [id, number]));
  const entries = steps
    .filter(({ kind }) => kind === 'finding')
    .map(({ id, number, title }) => {
      const way = ways[id]?.map((step) => numbers.get(step) ?? step).join(' ');
      return `  ${number}, ${title}\n     ${way ?? 'No way leads there.'}`;
    });
  return ['One shortest way to each finding, by step:', ...entries].join('\n');
}

const counted = (count: number, word: string): string => `${count} ${word}${count === 1 ? '' : 's'}`;

const joined = (parts: readonly string[]): string => `${parts.filter((part) => part !== '').join('\n\n')}\n`;
