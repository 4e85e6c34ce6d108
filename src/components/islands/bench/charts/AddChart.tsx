import { Dialog } from '@/components/ui/Dialog';
import { addChart } from '../state/actions';
import { useBench, useTools } from '../state/tools';

/** The pages a chart can be read from. */
export function PageChoice({ onChosen }: { onChosen: () => void }) {
  const tools = useTools();
  const charts = useBench((state) => state.history.present.charts);
  if (tools.pages.length === 0) {
    return (
      <p>
        The sheet has no page yet. <a href={`/sheets/${tools.reading.sheets[0]?.id ?? ''}`}>Upload a page to the sheet</a>, then come back.
      </p>
    );
  }
  return (
    <ul className="bench-pages">
      {tools.pages.map((page) => {
        const used = charts.filter((chart) => chart.pictureId === page.picture.id).length;
        return (
          <li key={page.picture.id}>
            <button
              type="button"
              className="sheet bench-tile"
              onClick={() => {
                addChart(tools, page);
                onChosen();
              }}
            >
              <img
                src={`${page.picture.url}/thumbnail`}
                alt=""
                width={page.picture.width}
                height={page.picture.height}
                loading="lazy"
                decoding="async"
              />
              <span>{page.label || page.picture.name}</span>
              <small>
                {page.sheet}
                {used > 0 && ` · ${used} chart${used === 1 ? '' : 's'} already`}
              </small>
            </button>
          </li>
        );
      })}
    </ul>
  );
}

/** A chart may be added from any page; several charts of one picture are several charts here. */
export function AddChart({ isOpen, onClose }: { isOpen: boolean; onClose: () => void }) {
  return (
    <Dialog title="Add a chart from a page" isOpen={isOpen} onClose={onClose} wide>
      <PageChoice onChosen={onClose} />
    </Dialog>
  );
}
