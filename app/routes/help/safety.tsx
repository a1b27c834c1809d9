import {
  cautionDrain,
  cautionsAfter,
  cautionsBefore,
  cautionsDuring,
  cautionsPedal,
  deference,
} from '~/components/caution-words';
import { Cautions } from '~/components/cautions';
import type { Route } from './+types/safety';
import { HelpPage } from './help-page';

export default function Safety() {
  return (
    <HelpPage title="Safety">
      <p className="lead">{deference}</p>
      <h2>Before</h2>
      <Cautions items={cautionsBefore} />
      <h2>Bringing the supply down</h2>
      <Cautions items={[...cautionsPedal, cautionDrain]} />
      <h2>During</h2>
      <Cautions items={cautionsDuring} />
      <h2>After</h2>
      <p>A round cannot be closed without this list.</p>
      <Cautions items={cautionsAfter} />
      <h2>Where this comes from</h2>
      <ul className="sources">
        <li>
          The pedal and the spring brakes: commercial driver licence manual, section 5 (air brakes).
        </li>
        <li>
          Clip-on chuck, in-line valve with gauge, enough hose to stand outside the trajectory: 29
          CFR 1910.177(d)(4).
        </li>
        <li>
          A tire at 80 % or less of its recommended pressure is taken off and inspected: 29 CFR
          1910.177(f)(2)(i), written for people at work and multi-piece rims, taken over as trade
          practice.
        </li>
        <li>
          Never above the sidewall’s maximum or the wheel’s rating: motorhome makers’ manuals.
        </li>
        <li>Low-air warning below 60 psi: 49 CFR 571.121 S5.1.5.</li>
        <li>
          Five minutes of continuous pumping, and what names no source: practice of the trade.
        </li>
      </ul>
      <p>
        When you are not sure, don’t fill. Have a licensed technician look at tire, wheel and air
        system.
      </p>
    </HelpPage>
  );
}

export const meta: Route.MetaFunction = () => [{ title: 'Safety · Valveside' }];
