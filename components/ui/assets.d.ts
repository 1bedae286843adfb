/** Metro gives a number for a bundled file. */
declare module '*.ttf' {
  const source: number;
  export default source;
}
