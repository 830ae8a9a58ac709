const MAX_NAME = 200;

/**
 * Names for the columns of a file, each one different: the cells of the heading, trimmed; "column 3" where the heading
 * is blank or there is none; "score (2)" for a name met before.
 */
export function columnNames(heading: readonly string[] | null, width: number): readonly string[] {
  const taken = new Set<string>();
  return Array.from({ length: width }, (_, index) => {
    const wanted = (heading?.[index] ?? '').replace(/\s+/g, ' ').trim().slice(0, MAX_NAME) || `column ${index + 1}`;
    let name = wanted;
    for (let copy = 2; taken.has(name); copy += 1) name = `${wanted} (${copy})`;
    taken.add(name);
    return name;
  });
}
