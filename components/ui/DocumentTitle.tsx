/** The name of the screen for the window; a native application has none. */
export function DocumentTitle(_props: { title: string }) {
  return null;
}
