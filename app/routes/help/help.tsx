import { Link } from 'react-router';
import type { Route } from './+types/help';
import { CycleDrawing } from './cycle-drawing';
import { HelpPage } from './help-page';

export default function Help() {
  return (
    <HelpPage title="How the cycle works">
      <p className="lead">
        Your coach makes its own air for the brakes. That air can fill your tires, as long as it is
        higher than the tire.
      </p>
      <CycleDrawing />
      <h2>Why it goes up and down</h2>
      <p>
        A governor starts the compressor at <b>cut-in</b> and rests it at <b>cut-out</b>. Between
        the two the supply swings, roughly from 90 to 120 psi. At cut-out the air drier purges: you
        hear it.
      </p>
      <p>
        Front tires of a heavy coach want 105 to 115 psi. So the tire’s pressure lies inside the
        swing. Put the chuck on at the wrong moment and the tire loses air.
      </p>
      <h2>Fill on the rising side</h2>
      <ol>
        <li>Read the gauge at the wheel. The screen needs to know where the supply stands.</li>
        <li>
          Bring the supply down to cut-in, so that the compressor starts. The screen says when, and
          how your coach allows it.
        </li>
        <li>Set fast idle. The supply rises faster.</li>
        <li>When the supply is above the tire, the screen says “Put it on”.</li>
        <li>Keep it on for as long as the countdown runs. Stay with the tire.</li>
        <li>“Take it off”: at once. Then gauge the tire and type what it reads.</li>
      </ol>
      <h2>What the picture means</h2>
      <p>
        The level is the supply. Its edge is soft by as much as it is not known. The hard line is
        your tire. Filled above the line is headroom. Hatched below it is what is missing.
      </p>
      <p>
        A filled panel says that the chuck belongs on. A framed one says that it belongs off. A
        large call says that it is not there yet.
      </p>
      <h2>What you tap</h2>
      <p>
        Tap what your own gauge shows, as it shows it. The screen offers values near the likely one;
        none of them is meant to be agreed with. “Other value” opens a keypad. What you tapped can
        be taken back for ten seconds.
      </p>
      <p>
        While the chuck is on, the gauge reads lower than the supply, because the hose takes its
        share. The screen knows that.
      </p>
      <p>
        <Link to="/practice">Practise it on a simulated coach</Link>
      </p>
    </HelpPage>
  );
}

export const meta: Route.MetaFunction = () => [{ title: 'How the cycle works · Valveside' }];
