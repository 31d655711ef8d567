/** What one piece of a strip is. `safety` is found and dangerous; `not-yet` cannot be seen at its age. */
export type Piece =
  | { kind: 'found'; severity: number } | { kind: 'clear' } | { kind: 'not-checked' } | { kind: 'not-yet' } | { kind: 'safety' }
  | { kind: 'firsts' } | { kind: 'seconds' } | { kind: 'rebatch' } | { kind: 'embeds' } | { kind: 'discarded' } | { kind: 'kept' } | { kind: 'rack' };

function Shape({ piece, x, w, h }: { piece: Piece; x: number; w: number; h: number }) {
  const open = <rect x={x + 0.5} y="0.5" width={w - 1} height={h - 1} className="fill-lift stroke-line-firm" />;
  switch (piece.kind) {
    case 'found': {
      const filled = (h * piece.severity) / 3;
      return <><rect x={x + 0.5} y="0.5" width={w - 1} height={h - 1} className="fill-more-wash stroke-more" /><rect x={x} y={h - filled} width={w} height={filled} className="fill-more-fill" /></>;
    }
    case 'safety': return <rect x={x} y="0" width={w} height={h} className="fill-safe-fill" />;
    case 'clear': return open;
    case 'not-checked': return <rect x={x} y={h - 2} width={w} height="2" className="fill-line-firm" />;
    case 'not-yet': return <rect x={x + w / 2 - 1} y={h - 2} width="2" height="2" className="fill-line-firm" />;
    case 'firsts': return <rect x={x} y="0" width={w} height={h} className="fill-ink" />;
    case 'seconds': return <>{open}<path d={`M${x} ${h}L${x + w} 0V${h}z`} className="fill-ink" /></>;
    case 'kept': return <>{open}<circle cx={x + w / 2} cy={h / 2} r={Math.min(2.2, w / 4)} className="fill-ink" /></>;
    case 'rack': return <>{open}<rect x={x + 2} y={h - 4} width={Math.max(1, w - 4)} height="2" className="fill-ink" /></>;
    case 'discarded': return <>{open}<path d={`M${x + 1} 1L${x + w - 1} ${h - 1}M${x + w - 1} 1L${x + 1} ${h - 1}`} className="fill-none stroke-ink" /></>;
    case 'rebatch': return <>{open}<path d={`M${x} ${h / 2}h${w}M${x} ${h / 4}h${w}M${x} ${h * 0.75}h${w}`} className="fill-none stroke-ink" /></>;
    case 'embeds': return <>{open}<path d={`M${x + w / 2} 0v${h}M${x} ${h / 2}h${w}`} className="fill-none stroke-ink" /></>;
  }
}

/**
 * Everything countable is shown cut into its pieces, one per thing counted.
 *
 * @param props.label says the same in words, e.g. "8 of 10 found, 1 not looked at"
 */
export function Strip({ pieces, label, width = 10, height = 18, gap = 2 }: { pieces: readonly Piece[]; label: string; width?: number; height?: number; gap?: number }) {
  const whole = Math.max(1, pieces.length * (width + gap) - gap);
  return (
    <svg width={whole} height={height} viewBox={`0 0 ${whole} ${height}`} preserveAspectRatio="none" role="img" aria-label={label} className="fill-keeps block max-w-full">
      {pieces.map((piece, index) => <Shape key={index} piece={piece} x={index * (width + gap)} w={width} h={height} />)}
    </svg>
  );
}
