import { memo } from 'react';
import { Button } from '@/components/ui/Button';
import { chartName, progressOf, type BenchChart } from '@/lib/editor';
import { useBench, useTools, type BenchPage } from '../state/tools';

/** The charts of the reading, each with its picture and how far it has come. */
export const ChartList = memo(function ChartList({ onAdd }: { onAdd: () => void }) {
  const { pages, frozen } = useTools();
  const charts = useBench((state) => state.history.present.charts);
  return (
    <nav className="bench-charts" aria-label="Charts">
      <h2>Charts</h2>
      <ul>
        {charts.map((chart) => (
          <li key={chart.id}>
            <ChartTile chart={chart} page={pages.find(({ picture }) => picture.id === chart.pictureId) ?? null} />
          </li>
        ))}
      </ul>
      {!frozen && <Button onPress={onAdd}>Add a chart</Button>}
    </nav>
  );
});

function ChartTile({ chart, page }: { chart: BenchChart; page: BenchPage | null }) {
  const { store } = useTools();
  const inHand = useBench((state) => state.session.chart === chart.id);
  return (
    <button
      type="button"
      className="sheet bench-tile"
      aria-current={inHand ? 'true' : undefined}
      onClick={() => store.go({ type: 'chart', chart: chart.id })}
    >
      {page && (
        <img src={`${page.picture.url}/thumbnail`} alt="" width={chart.width} height={chart.height} loading="lazy" decoding="async" />
      )}
      <span>{chartName(chart)}</span>
      <small>{progressOf(chart)}</small>
    </button>
  );
}
