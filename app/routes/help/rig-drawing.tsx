/** The hose from the coach's fitting to the valve stem, drawn as a line with its parts named. */
export function RigDrawing() {
  return (
    <figure className="drawing">
      <svg viewBox="0 0 640 380" role="img" aria-labelledby="rig-title">
        <title id="rig-title">
          From the coach’s fitting: connector, hose, ball valve, tee with gauge, a metre and a half
          of hose, clip-on chuck, valve stem.
        </title>
        <g fill="none" stroke="var(--ink)" strokeWidth="3">
          {/* coach wall and fitting */}
          <path d="M24 40 V170" strokeWidth="8" />
          <path d="M28 104 H52 M52 94 H74 V114 H52 Z" />
          {/* hose to the valve */}
          <path d="M74 104 C130 104 120 104 176 104" strokeWidth="7" />
          {/* ball valve: body, handle across the hose when shut */}
          <path d="M176 90 H216 V118 H176 Z" fill="var(--paper)" />
          <path d="M196 90 V66 M180 66 H230" />
          {/* tee and gauge */}
          <path d="M216 104 H256" strokeWidth="7" />
          <path d="M256 88 H300 V120 H256 Z" fill="var(--paper)" />
          <path d="M278 88 V72" />
          <rect x="246" y="28" width="64" height="44" fill="var(--paper)" />
          {/* a metre and a half of hose */}
          <path d="M300 104 C420 104 452 130 452 180 S430 268 500 268" strokeWidth="7" />
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
          <text x="278" y="57" textAnchor="middle" fontWeight="700">
            108
          </text>
          <text x="36" y="34">
            coach’s fitting
          </text>
          <text x="36" y="146">
            connector that matches
          </text>
          <text x="158" y="52" textAnchor="middle">
            ball valve
          </text>
          <text x="322" y="46">
            tee with gauge, 160 psi or more
          </text>
          <text x="440" y="190" textAnchor="end">
            1.5 m of hose, 200 psi or more
          </text>
          <text x="490" y="244" textAnchor="end">
            clip-on chuck, closed
          </text>
          <text x="602" y="368" textAnchor="middle">
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
