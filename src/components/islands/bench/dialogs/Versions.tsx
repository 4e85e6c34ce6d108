import { chartName, compareDocuments, type BenchDocument, type ChartTally } from '@/lib/editor';

/** A version of the draft, and who made it when, in words for the head of a column. */
export interface Version {
  readonly document: BenchDocument;
  readonly head: string;
}

const tally = (held: ChartTally | null): string => {
  if (!held) return 'not there';
  const word = (n: number, one: string) => `${n}\u00A0${one}${n === 1 ? '' : 's'}`;
  return `${word(held.marks, 'mark')}, ${word(held.curves, 'curve')}, ${word(held.points, 'point')}`;
};

/** Two versions of a draft side by side, chart by chart. */
export function Versions({ mine, theirs }: { mine: Version; theirs: Version }) {
  const nameOf = (id: string) => {
    const chart = [...mine.document.charts, ...theirs.document.charts].find((candidate) => candidate.id === id);
    return chart ? chartName(chart) : id;
  };
  const rows = compareDocuments(mine.document, theirs.document);
  return (
    <div className="table-scroll">
      <table className="table">
        <caption>What each version holds</caption>
        <thead>
          <tr>
            <th scope="col">Chart</th>
            <th scope="col">{mine.head}</th>
            <th scope="col">{theirs.head}</th>
            <th scope="col">Difference</th>
          </tr>
        </thead>
        <tbody>
          {rows.map(({ id, mine: a, theirs: b, same }) => (
            <tr key={id}>
              <th scope="row">{nameOf(id)}</th>
              <td>{tally(a)}</td>
              <td>{tally(b)}</td>
              <td>{same ? 'none' : 'differs'}</td>
            </tr>
          ))}
          {rows.length === 0 && (
            <tr>
              <td colSpan={4}>Neither version has a chart.</td>
            </tr>
          )}
        </tbody>
      </table>
    </div>
  );
}
