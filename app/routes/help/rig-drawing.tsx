/** The hose from the coach's fitting to the valve stem, drawn as a line with its parts named. */
export function RigDrawing() {
  return (
    <figure className="drawing">
      <svg viewBox="0 0 640 380" role="img" aria-labelledby="rig-title">
        <title id="rig-title">
          From the coach’s fitting: connector, hose, tee with gauge, ball valve, a metre and a half
          of hose, clip-on chuck, valve stem.
        </title>
        <g fill="none" stroke="var(--ink)" strokeWidth="3">
          {/* coach wall and fitting */}
          <path d="M24 70 V200" strokeWidth="8" />
          <path d="M28 134 H52 M52 124 H74 V144 H52 Z" />
          {/* hose to the tee and its gauge */}
          <path d="M74 134 H166" strokeWidth="7" />
          <path d="M166 118 H210 V150 H166 Z" fill="var(--paper)" />
          <path d="M188 118 V100" />
          <rect x="156" y="56" width="64" height="44" fill="var(--paper)" />
          {/* ball valve below the gauge, its handle along the hose: open */}
          <path d="M210 134 H262" strokeWidth="7" />
          <path d="M262 120 H302 V148 H262 Z" fill="var(--paper)" />
          <path d="M282 148 V166 M264 166 H322" />
          {/* a metre and a half of hose */}
          <path d="M302 134 C400 134 424 150 424 200 S430 268 500 268" strokeWidth="7" />
          {/* chuck on the stem */}
          <path d="M500 252 H546 V284 H500 Z" fill="var(--paper)" />
          <path d="M512 252 L504 226 H530" />
          <path d="M546 262 H580 V274 H546 Z" fill="var(--paper)" />
          {/* the tire as its vessel, seen from the side to stand at */}
          <path d="M580 190 V346 M580 346 H628 M628 190 V346" strokeWidth="4" />
        </g>
        <rect x="582" y="250" width="44" height="94" fill="var(--air)" />
        <path d="M570 250 H638" stroke="var(--paper)" strokeWidth="10" />
        <path d="M570 250 H638" stroke="var(--ink)" strokeWidth="5" />
        <g className="drawing-text">
          <text x="188" y="85" textAnchor="middle" fontWeight="700">
            108
          </text>
          <text x="16" y="56">
            coach’s fitting
          </text>
          <text x="40" y="190">
            connector
          </text>
          <text x="40" y="212">
            that matches
          </text>
          <text x="234" y="85">
            tee with gauge, 160 psi or more
          </text>
          <text x="292" y="190" textAnchor="middle">
            ball valve
          </text>
          <text x="444" y="150">
            1.5 m of hose,
          </text>
          <text x="444" y="172">
            200 psi or more
          </text>
          <text x="522" y="312" textAnchor="end">
            clip-on chuck, closed
          </text>
          <text x="604" y="368" textAnchor="middle">
            tire
          </text>
        </g>
      </svg>
      <figcaption>
        Air flows from left to right. You stand at the gauge and the valve, to the side, a metre and
        a half from the sidewall.
      </figcaption>
    </figure>
  );
}
