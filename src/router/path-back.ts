/** Where one goes after signing in: a path of ours from `?back=`, else the sheets. */
export function pathBack(back: unknown): string {
  // Two slashes would lead to another host.
  return typeof back === 'string' && /^\/(?![/\\])/.test(back) ? back : '/sheets'
}
