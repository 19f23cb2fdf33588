/** What stands between a file and a draft: where, and what to mend, in words. */
export interface FileProblem {
  /** The step's id; absent where it is not about one step. */
  readonly step?: string;
  /** The step as people say it, `5, Manifold pressure`. */
  readonly stepName?: string;
  /** The place: `branch 2`, `line 40`, `/steps/3/kind`. */
  readonly where: string;
  readonly message: string;
}

export type ReadFile =
  { readonly ok: true; readonly document: object } | { readonly ok: false; readonly problem: FileProblem };

/** The server takes no more than this. */
export const longestFileBytes = 2 * 1024 * 1024;

/** Reads a procedure file's text as JSON; whether it is a procedure is the server's to say. */
export function readProcedureFile(text: string): ReadFile {
  const bytes = new TextEncoder().encode(text).length;
  if (bytes > longestFileBytes) {
    const size = `${(bytes / 1024 / 1024).toFixed(1)} MB`;
    return refused('the file', `It has ${size}; a procedure may have 2 MB. Choose the procedure's own file.`);
  }
  try {
    const document: unknown = JSON.parse(text);
    if (typeof document === 'object' && document !== null && !Array.isArray(document)) return { ok: true, document };
    return refused('the file', 'It is JSON, but no procedure: a procedure begins with { and names its format.');
  } catch (error) {
    if (error instanceof SyntaxError) return refused(placeOf(error.message, text), 'This is no JSON. Mend it there.');
    throw error;
  }
}

function refused(where: string, message: string): ReadFile {
  return { ok: false, problem: { where, message } };
}

/** Browsers name the place as a line, as a position, or not at all. */
function placeOf(message: string, text: string): string {
  const line = /line (\d+)/.exec(message)?.[1];
  if (line !== undefined) return `line ${line}`;
  const position = /position (\d+)/.exec(message)?.[1];
  if (position === undefined) return 'the end of the file';
  return `line ${text.slice(0, Number(position)).split('\n').length}`;
}
