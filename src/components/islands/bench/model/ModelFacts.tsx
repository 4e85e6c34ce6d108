import type { ModelAnswer, RatingBeside } from '@/lib/contracts';
import type { ReadingModel } from '@/lib/reading';
import { formatNumber, formatUncertain, formatWithUnit, unitSymbol } from '@/lib/units';
import { RATING_SYMBOLS } from '../points/words';
import { Uncertain } from './Uncertain';

/** α, R, K and Z with their standard uncertainty, and how well the form fits. */
export function ModelFacts({ model }: { model: ReadingModel }) {
  const z = model.derived[0];
  return (
    <>
      <dl className="pairs">
        <dt>α, Seebeck coefficient</dt>
        <dd>
          <Uncertain {...model.alpha} />
        </dd>
        <dt>R, resistance</dt>
        <dd>
          <Uncertain {...model.R} />
        </dd>
        <dt>K, conductance</dt>
        <dd>
          <Uncertain {...model.K} />
        </dd>
        {z && (
          <>
            <dt>Z at {formatWithUnit(z.hotSideC, 'C')}</dt>
            <dd>
              <Uncertain {...z.Z} />
            </dd>
          </>
        )}
        <dt>Heat, rms</dt>
        <dd>
          {model.rmsPercentOfQmax === null ? 'no heat chart' : `${formatNumber(model.rmsPercentOfQmax, { decimals: 2 })}\u00A0% of Qmax`}
        </dd>
        <dt>Voltage, rms</dt>
        <dd>
          {model.rmsPercentOfVmax === null ? 'no voltage chart' : `${formatNumber(model.rmsPercentOfVmax, { decimals: 2 })}\u00A0% of Vmax`}
        </dd>
      </dl>
      <p className="hint">
        {model.at === 'effective'
          ? 'Effective over this sheet: one value each for all its temperatures. '
          : `α, R and K are those at ${formatWithUnit(27, 'C')}. `}
        Figures in brackets are the standard uncertainty of the reading in the last digits, not the tolerance of a delivered module.
      </p>
    </>
  );
}

const correlation = (covariance: readonly (readonly number[])[], i: number, j: number): number =>
  (covariance[i]?.[j] ?? NaN) / Math.sqrt((covariance[i]?.[i] ?? NaN) * (covariance[j]?.[j] ?? NaN));

const SYMBOLS: Readonly<Record<string, string>> = { alpha: 'α' };

/** Covariance and correlation of the parameters, and how the equations stood. */
export function FitNumbers({ model, fit }: { model: ReadingModel; fit: ModelAnswer['fit'] }) {
  const names = model.parameters.map(({ name }) => SYMBOLS[name] ?? name);
  const cell = (i: number, j: number) =>
    i === j
      ? formatUncertain(Math.sqrt(model.covariance[i]?.[i] ?? NaN), undefined).text
      : formatNumber(correlation(model.covariance, i, j), { decimals: 3 });
  return (
    <details className="bench-details">
      <summary>Covariance and condition</summary>
      <table className="table">
        <caption>On the diagonal the standard uncertainty, beside it the correlation</caption>
        <thead>
          <tr>
            <td />
            {names.map((name) => (
              <th key={name} scope="col" className="num">
                {name}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {model.parameters.map(({ name, unit }, i) => (
            <tr key={name}>
              <th scope="row">
                {SYMBOLS[name] ?? name} / {unitSymbol(unit)}
              </th>
              {names.map((other, j) => (
                <td key={other} className="num">
                  {cell(i, j)}
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
      {fit && (
        <p className="hint mt-2">
          Rank {fit.rank} of {names.length}; condition number {formatNumber(fit.condition, { digits: 3 })};{' '}
          {fit.iterations === 0 ? 'solved directly' : `${fit.iterations} steps`}. {fit.why}
        </p>
      )}
    </details>
  );
}

/** Ratings as printed beside those the curves imply; no verdict. */
export function RatingsTable({ ratings }: { ratings: readonly RatingBeside[] }) {
  if (ratings.length === 0) return null;
  return (
    <table className="table">
      <caption>Ratings as printed, and what the curves imply</caption>
      <thead>
        <tr>
          <th scope="col">Rating</th>
          <th scope="col" className="num">
            Printed
          </th>
          <th scope="col" className="num">
            Implied
          </th>
        </tr>
      </thead>
      <tbody>
        {ratings.map(({ hotSideC, key, printed, implied, u, unit }) => (
          <tr key={`${hotSideC}${key}`}>
            <td>
              {RATING_SYMBOLS[key]} <small>at {formatWithUnit(hotSideC, 'C')}</small>
            </td>
            <td className="num">{printed === null ? <NotStated /> : formatWithUnit(printed, unit)}</td>
            <td className="num">{implied === null ? <NotStated /> : <Uncertain value={implied} u={u} unit={unit} />}</td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}

const NotStated = () => (
  <>
    <span aria-hidden="true">–</span>
    <span className="sr-only">not stated</span>
  </>
);
