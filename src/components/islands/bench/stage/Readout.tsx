import { useCallback, useRef } from 'react';
import { findChart, placeOfSelection, readyFrame } from '@/lib/editor';
import { formatNumber, quantitySymbol, unitSymbol } from '@/lib/units';
import { pixelText, smallNumber, valueTexts } from '../points/words';
import { useChart, useTools } from '../state/tools';
import { useFrame } from './use-frame';

/** What is pointed at, in pixels and in the units of the axes, and how far it is zoomed; written past React, since it changes with every move. */
export function Readout() {
  const { stage, store } = useTools();
  const chart = useChart();
  const pixel = useRef<HTMLElement>(null);
  const values = useRef<HTMLSpanElement>(null);
  const zoom = useRef<HTMLSpanElement>(null);

  const write = useCallback(() => {
    const { history, session } = store.get();
    const now = findChart(history.present, session.chart);
    const px = stage.aim()?.px ?? placeOfSelection(now, session.selection);
    if (pixel.current) pixel.current.textContent = px ? pixelText(px) : '–';
    if (values.current) values.current.textContent = now && px ? valueLine(now, px) : '';
    if (zoom.current) zoom.current.textContent = `${formatNumber(stage.viewport().scale * 100, { decimals: 0 })}\u00A0%`;
  }, [stage, store]);
  useFrame(stage, write);

  return (
    <p className="bench-readout">
      <span ref={values} />
      <span>
        pixel <b ref={pixel}>–</b>
      </span>
      {chart && <FrameNote chart={chart} />}
      <span ref={zoom} className="ml-auto" hidden={!chart} />
    </p>
  );
}

const valueLine = (chart: NonNullable<ReturnType<typeof useChart>>, px: readonly [number, number]): string => {
  const texts = valueTexts(chart, px);
  if (!texts) return '';
  return (['x', 'y'] as const)
    .map((axis, at) => {
      const { quantity, unit } = chart[axis];
      const symbol = unit ? unitSymbol(unit) : '';
      return `${quantity ? quantitySymbol(quantity) : axis}\u00A0${texts[at]}${symbol && `\u00A0${symbol}`}`;
    })
    .join('   ');
};

/** How good the frame is, in pixels and in the units of the y axis. */
function FrameNote({ chart }: { chart: NonNullable<ReturnType<typeof useChart>> }) {
  const frame = readyFrame(chart);
  if (!frame || frame.residualPx === null || frame.residualInUnits.y === null) return null;
  const unit = chart.y.unit ? unitSymbol(chart.y.unit) : '';
  return (
    <span className="bench-wide">
      frame good to {smallNumber(frame.residualPx)}&nbsp;px, that is {smallNumber(frame.residualInUnits.y)}
      {unit && `\u00A0${unit}`}
    </span>
  );
}
