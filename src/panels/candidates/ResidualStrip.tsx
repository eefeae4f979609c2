import type { Correlogram } from '../../../workers/contract/diagnostics.ts';

const most = 20;
/** Correlations beyond this are drawn at the edge. */
const largest = 0.3;
const height = 26;
const step = 3;

/** A small strip of residual correlations, so that candidates compare at a glance. */
export function ResidualStrip({ correlogram }: { readonly correlogram: Correlogram | null }) {
  if (correlogram === null) return null;
  const count = Math.min(most, correlogram.lags.length);
  const scale = (height / 2 - 1) / largest;
  const out = Array.from({ length: count }, (_, i) => Math.abs(correlogram.correlations[i]!) > correlogram.bands[i]!);
  const outside = out.filter(Boolean).length;
  return (
    <svg
      className="strip"
      width={most * step}
      height={height}
      role="img"
      aria-label={`Residual correlations at ${count} lags, ${outside} outside the band`}
    >
      <line x1={0} x2={most * step} y1={height / 2} y2={height / 2} className="strip-axis" />
      {out.map((isOut, i) => {
        const size = Math.max(-largest, Math.min(largest, correlogram.correlations[i]!)) * scale;
        return (
          <rect
            key={i}
            x={i * step + 0.5}
            width={2}
            y={height / 2 - Math.max(size, 0)}
            height={Math.max(Math.abs(size), 0.5)}
            className={isOut ? 'strip-out' : 'strip-in'}
          />
        );
      })}
    </svg>
  );
}
