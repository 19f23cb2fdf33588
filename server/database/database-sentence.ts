/** What a failed way into the database means, as a sentence with the way out; never the URL, which holds a password. */
export function databaseSentence(error: Error): string {
  const code = codeOf(error);
  switch (code) {
    case 'ECONNREFUSED':
    case 'ENOTFOUND':
    case 'EAI_AGAIN':
    case 'ETIMEDOUT':
      return `PostgreSQL does not answer at the URL's host and port (${code}): start it, or correct the URL.`;
    case '28P01':
    case '28000':
      return 'PostgreSQL refuses the role or its password: correct them in the URL.';
    case '3D000':
      return 'PostgreSQL has no database of that name: create it, owned by the role of DATABASE_OWNER_URL.';
    case '42704':
      return `A role is missing (${error.message}): create the role that DATABASE_URL names, with LOGIN.`;
    case '42501':
      return `A role lacks a right (${error.message}): the role of DATABASE_OWNER_URL must own the database.`;
    case '53300':
      return 'PostgreSQL takes no more connections: end others, or raise max_connections.';
    default:
      return code === undefined ? error.message : `${error.message} (${code})`;
  }
}

function codeOf(error: Error): string | undefined {
  const { code, errors } = error as { code?: unknown; errors?: unknown };
  if (typeof code === 'string') return code;
  // A host with several addresses fails with one error for each.
  const first: unknown = Array.isArray(errors) ? errors[0] : undefined;
  return first instanceof Error ? codeOf(first) : undefined;
}
