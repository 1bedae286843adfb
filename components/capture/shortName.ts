/** A file name held to `most` characters: the middle goes, because frames of a series differ at the end. */
export function shortName(name: string, most: number): string {
  if (name.length <= most) return name;
  const tail = Math.ceil((most - 1) * 0.6);
  return `${name.slice(0, most - 1 - tail)}…${name.slice(-tail)}`;
}
