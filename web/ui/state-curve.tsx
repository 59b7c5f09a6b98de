import type { State } from '../../schemas/api.ts';
import { curveShape, NODES, type Lobe } from './curve-shape.ts';

interface StateCurveProps {
  readonly state: State;
  /** `small` leaves out the names of the nodes, for tables. */
  readonly size?: 'full' | 'small';
}

const SPAN = 68;
const LEFT = 8;

/** The motif: a revision's way as a standing wave between four nodes. The lobe in progress swings. */
export function StateCurve({ state, size = 'full' }: StateCurveProps) {
  const { reached, lobes, words } = curveShape(state);
  const isFull = size === 'full';
  const axis = 19;
  const scale = isFull ? 'h-14 w-[13.75rem]' : 'h-6 w-28';
  return (
    <svg
      viewBox={isFull ? '0 0 220 56' : '0 0 220 38'}
      className={`shrink-0 overflow-visible ${scale}`}
      role="img"
      aria-label={`State: ${words}`}
    >
      <line x1={LEFT} x2={LEFT + 3 * SPAN} y1={axis} y2={axis} className="stroke-rule" strokeWidth="1.5" />
      {lobes.map((lobe, index) => (
        <LobePath key={index} lobe={lobe} from={LEFT + index * SPAN} axis={axis} />
      ))}
      {NODES.map((name, index) => (
        <g key={name}>
          <circle
            cx={LEFT + index * SPAN}
            cy={axis}
            r={isFull ? 3.6 : 5}
            strokeWidth={isFull ? 1.5 : 2.2}
            className={index <= reached ? 'fill-ink stroke-ink' : 'fill-paper stroke-pencil'}
          />
          {isFull && (
            <text
              x={LEFT + index * SPAN}
              y={50}
              textAnchor={index === 0 ? 'start' : index === NODES.length - 1 ? 'end' : 'middle'}
              dx={index === 0 ? -LEFT : index === NODES.length - 1 ? LEFT : 0}
              className={`text-[11px] ${index === reached ? 'fill-ink font-semibold' : 'fill-pencil'}`}
            >
              {name}
            </text>
          )}
        </g>
      ))}
    </svg>
  );
}

interface LobeProps {
  readonly lobe: Lobe;
  readonly from: number;
  readonly axis: number;
}

function LobePath({ lobe, from, axis }: LobeProps) {
  const upper = `M${from} ${axis}c${SPAN / 3} -20 ${(2 * SPAN) / 3} -20 ${SPAN} 0`;
  const lower = `M${from} ${axis}c${SPAN / 3} 20 ${(2 * SPAN) / 3} 20 ${SPAN} 0`;
  const style = { transformOrigin: `${from}px ${axis}px` };
  switch (lobe) {
    case 'ahead':
      return null;
    case 'done':
      return <path d={upper} fill="none" className="stroke-ink" strokeWidth="1.8" />;
    case 'broken':
      return <path d={upper} fill="none" className="stroke-madder" strokeWidth="1.8" strokeDasharray="5 4" />;
    case 'swinging':
      return (
        <g fill="none" className="stroke-copper">
          <path d={upper} strokeWidth="1.2" strokeDasharray="2.5 3" opacity="0.7" />
          <path d={lower} strokeWidth="1.2" strokeDasharray="2.5 3" opacity="0.7" />
          <path d={upper} strokeWidth="2" className="swing" style={style} />
        </g>
      );
  }
}
