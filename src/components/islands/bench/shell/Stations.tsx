import { problemsOf, STATIONS, type BenchChart, type Station } from '@/lib/editor';
import { useChart, useSession, useTools } from '../state/tools';

const NAMES: Readonly<Record<Station, string>> = { chart: 'Chart', frame: 'Frame', curves: 'Curves', model: 'Model', 'hand-in': 'Hand in' };

/** A station is done when the chart in hand misses nothing there; model and hand in are never done. */
const isDone = (chart: BenchChart | null, station: Station): boolean =>
  chart !== null && station !== 'model' && station !== 'hand-in' && problemsOf(chart).every((problem) => problem.station !== station);

/** The five stations, in order; any may be entered at any time. */
export function Stations() {
  const { store } = useTools();
  const { station: at } = useSession();
  const chart = useChart();
  return (
    <nav aria-label="Stations" className="bench-stations">
      <ol>
        {STATIONS.map((station, index) => {
          const done = isDone(chart, station);
          return (
            <li key={station}>
              <button
                type="button"
                aria-current={station === at ? 'step' : undefined}
                data-done={done || undefined}
                onClick={() => store.go({ type: 'station', station })}
              >
                <em aria-hidden="true">{done && station !== at ? '✓' : index + 1}</em>
                <span>{NAMES[station]}</span>
                {done && <span className="sr-only">, done</span>}
              </button>
            </li>
          );
        })}
      </ol>
    </nav>
  );
}
