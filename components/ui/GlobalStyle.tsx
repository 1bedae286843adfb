/** The page around the application; a native one has none. */
export function GlobalStyle() {
  return null;
}
