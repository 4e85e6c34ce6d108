/** One thing that two versions say differently; null is "not stated". */
export interface Difference {
  readonly name: string;
  readonly mine: string | null;
  readonly theirs: string | null;
}

type Lines = readonly (readonly [name: string, words: string])[];

/** What two versions state differently, in the order of the first and then of the second. */
export function differences(mine: Lines, theirs: Lines): Difference[] {
  const [here, there] = [new Map(mine), new Map(theirs)];
  const names = [...new Set([...here.keys(), ...there.keys()])];
  return names
    .map((name) => ({ name, mine: here.get(name) || null, theirs: there.get(name) || null }))
    .filter((line) => line.mine !== line.theirs);
}
