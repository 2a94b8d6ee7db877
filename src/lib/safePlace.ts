/** An address of this site to go on to after the sign-in; anything else becomes the start. */
export function safePlace(to: string | null): string {
  // '//host' and '/\host' leave the site.
  return to && /^\/(?![/\\])/.test(to) ? to : '/';
}
