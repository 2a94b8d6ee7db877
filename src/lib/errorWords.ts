/** The words of any thrown thing. Errors of our own already say what to do next. */
export function errorWords(error: unknown): string {
  if (typeof error === 'string') return error;
  if (error instanceof Error && error.message) return error.message;
  return 'Something went wrong. Try again; if it stays, reload the page.';
}
