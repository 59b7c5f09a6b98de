import type { FigureBlock } from '../../core/report/model.ts';
import { extent, ticks, tickText } from './scale.ts';

const WIDTH = 640;
const HEIGHT = 260;
const LEFT = 56;
const RIGHT = 22;
const TOP = 12;
const BOTTOM = 40;

/** More lines than the five inks of the report tell apart are drawn alike, in the lighter ink. */
const MOST_INKS = 5;

/** A plain drawing: lines over an axis of values, bars over orders, the limit in copper. The table beside it says the same. */
export function FigureDrawing({ block }: { readonly block: FigureBlock }) {
  const { x, series, limit, label, unit } = block;
  const xs = x.values.map((value, i) => (typeof value === 'number' ? value : i));
  const limits = limit?.values ?? [];
  const [bottom, top] = extent([...series.flatMap(({ values }) => values), ...limits]);
  const isBars = block.kind === 'spectrum';
  const [x0, x1] = [xs[0] ?? 0, xs.at(-1) ?? 1];
  const pad = isBars ? 0.5 : 0;
  const across = (value: number): number =>
    LEFT + ((value - x0 + pad) / (x1 - x0 + 2 * pad || 1)) * (WIDTH - LEFT - RIGHT);
  const up = (value: number): number => HEIGHT - BOTTOM - ((value - bottom) / (top - bottom)) * (HEIGHT - TOP - BOTTOM);
  const xTicks = isBars && xs.length <= 20 ? xs : ticks(x0, x1, 7);
  const xLabel = x.unit === undefined ? x.name : `${x.name}, ${x.unit}`;
  return (
    <svg
      className="an-drawing"
      viewBox={`0 0 ${WIDTH} ${HEIGHT}`}
      role="img"
      aria-label={`${label}: ${unit} over ${xLabel}`}
    >
      {ticks(bottom, top, 5).map((tick) => (
        <g key={tick}>
          <line className="an-drawing-grid" x1={LEFT} x2={WIDTH - RIGHT} y1={up(tick)} y2={up(tick)} />
          <text className="an-drawing-tick" x={LEFT - 6} y={up(tick)} textAnchor="end" dominantBaseline="middle">
            {tickText(tick)}
          </text>
        </g>
      ))}
      {xTicks.map((tick) => (
        <g key={tick}>
          <line
            className="an-drawing-grid"
            x1={across(tick)}
            x2={across(tick)}
            y1={HEIGHT - BOTTOM}
            y2={HEIGHT - BOTTOM + 4}
          />
          <text className="an-drawing-tick" x={across(tick)} y={HEIGHT - BOTTOM + 16} textAnchor="middle">
            {typeof x.values[0] === 'number' ? tickText(tick) : x.values[tick]}
          </text>
        </g>
      ))}
      <line className="an-drawing-axis" x1={LEFT} x2={WIDTH - RIGHT} y1={HEIGHT - BOTTOM} y2={HEIGHT - BOTTOM} />
      <text className="an-drawing-tick" x={(LEFT + WIDTH - RIGHT) / 2} y={HEIGHT - 6} textAnchor="middle">
        {xLabel}
      </text>
      {series.map((line, i) =>
        isBars && series.length === 1 ? (
          <Bars key={line.label} values={line.values} xs={xs} across={across} up={up} />
        ) : (
          <polyline
            key={line.label}
            className={`an-drawing-line an-ink-${series.length > MOST_INKS ? 'many' : String(i + 1)}`}
            points={line.values.map((value, n) => `${across(xs[n] ?? 0).toFixed(1)},${up(value).toFixed(1)}`).join(' ')}
          />
        ),
      )}
      {limits.length > 0 && (
        <polyline
          className="an-drawing-limit"
          points={(limits.length === 1 ? [x0 - pad, x1 + pad] : xs)
            .map((at, n) => `${across(at).toFixed(1)},${up(limits[n] ?? limits[0] ?? 0).toFixed(1)}`)
            .join(' ')}
        />
      )}
      {limits.length > 0 && (
        <text
          className="an-drawing-tick an-drawing-limit-word"
          x={WIDTH - RIGHT - 2}
          y={up(limits.at(-1) ?? 0) - 5}
          textAnchor="end"
        >
          limit
        </text>
      )}
    </svg>
  );
}

interface BarsProps {
  readonly values: readonly number[];
  readonly xs: readonly number[];
  readonly across: (value: number) => number;
  readonly up: (value: number) => number;
}

function Bars({ values, xs, across, up }: BarsProps) {
  const width = Math.max(1, (across(1) - across(0)) * 0.5);
  const floor = up(0);
  return values.map((value, i) => {
    const at = across(xs[i] ?? 0);
    const top = Math.min(floor, up(value));
    return (
      <rect
        key={i}
        className="an-drawing-bar"
        x={at - width / 2}
        y={top}
        width={width}
        height={Math.abs(floor - up(value))}
      />
    );
  });
}
