/** Where to go after signing in: a path of this site, whatever the address line says. */
export function returnPath(next: string | undefined): string {
  return next && /^\/(?![/\\])[^\u0000-\u001f]*$/.test(next) ? next : "/";
}
