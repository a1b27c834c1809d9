/** The supply over time, between cut-in and cut-out, with a tire's line across it. */
export function CycleDrawing() {
  const rise1 = 'M40 190 L170 50';
  const fall = 'L430 190';
  const rise2 = 'L560 50 L620 82';
  return (
    <figure className="drawing">
      <svg viewBox="0 0 640 270" role="img" aria-labelledby="cycle-title">
        <title id="cycle-title">
          The supply rises fast from cut-in to cut-out and falls slowly back. The tire’s line
          crosses it: above the line air goes in, below it air comes out.
        </title>
        <defs>
          <clipPath id="cycle-above">
            <rect x="0" y="0" width="640" height="112" />
          </clipPath>
          <clipPath id="cycle-below">
            <rect x="0" y="112" width="640" height="100" />
          </clipPath>
          <pattern
            id="cycle-hatch"
            width="10"
            height="10"
            patternTransform="rotate(45)"
            patternUnits="userSpaceOnUse"
          >
            <rect width="5" height="10" fill="var(--out)" />
          </pattern>
        </defs>
        <path
          d={`${rise1} ${fall} ${rise2} V112 H40 Z`}
          fill="var(--head)"
          clipPath="url(#cycle-above)"
        />
        <path
          d="M40 112 H112 L40 190 Z M300 112 L430 190 L502 112 Z"
          fill="url(#cycle-hatch)"
          clipPath="url(#cycle-below)"
        />
        <path d={`${rise1} ${fall} ${rise2}`} fill="none" stroke="var(--ink)" strokeWidth="3" />
        <path d="M20 112 H630" stroke="var(--paper)" strokeWidth="10" />
        <path d="M20 112 H630" stroke="var(--ink)" strokeWidth="5" />
        <path d="M20 50 H630 M20 190 H630" stroke="var(--ink)" strokeDasharray="2 7" />
        <g className="drawing-text">
          <text x="632" y="44" textAnchor="end">
            cut-out
          </text>
          <text x="632" y="208" textAnchor="end">
            cut-in
          </text>
          <text x="232" y="136">
            tire
          </text>
          <text x="140" y="244" textAnchor="middle">
            compressor runs: rises fast
          </text>
          <text x="420" y="244" textAnchor="middle">
            compressor rests: falls slowly
          </text>
        </g>
      </svg>
      <figcaption>
        Filled: headroom, air goes in. Hatched: the supply is below the tire, air would come out.
        The figure shows the shape of the cycle, not a measured one.
      </figcaption>
    </figure>
  );
}
