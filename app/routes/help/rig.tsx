import type { Route } from './+types/rig';
import { HelpPage } from './help-page';
import { RigDrawing } from './rig-drawing';

export default function Rig() {
  return (
    <HelpPage title="The rig">
      <p className="lead">What the readings rest on. You are asked about it once for each coach.</p>
      <RigDrawing />
      <h2>The parts</h2>
      <dl className="terms">
        <dt>A closed clip-on chuck</dt>
        <dd>It shuts off by itself and holds by itself. Your hands are free and away.</dd>
        <dt>A tee with a gauge</dt>
        <dd>
          The gauge spans at least 160 psi. It sits better a metre and a half up the hose than at
          the chuck.
        </dd>
        <dt>A ball valve below the gauge</dt>
        <dd>
          So that nobody stands before the sidewall. The chuck goes on with the valve closed. The
          screen then says “Open it” and “Close it”.
        </dd>
        <dt>Hose and fittings</dt>
        <dd>Rated 200 psi or more, with a connector that matches the coach’s own.</dd>
      </dl>
      <p className="quiet">
        Clip-on chuck, in-line valve with gauge or regulator, enough hose between: 29 CFR
        1910.177(d)(4).
      </p>
      <h2>Not every fitting gives air</h2>
      <p>
        A tow-in inlet may hold a one-way valve. An accessory outlet may sit on a small tank behind
        a protection valve and a check valve. That tank keeps the peak and doesn’t follow when the
        supply is brought down.
      </p>
      <p>So a new coach starts with the fitting test:</p>
      <ol>
        <li>Put the hose on the fitting. Does air come out?</li>
        <li>Bring the supply down by 10 psi. Does the gauge follow?</li>
      </ol>
      <dl className="terms">
        <dt>Follows the supply</dt>
        <dd>The fitting gives the coach’s own air. Use it.</dd>
        <dt>Accessory tank</dt>
        <dd>It works, and the screen allows for the small tank.</dd>
        <dt>Gives no air</dt>
        <dd>Find another fitting.</dd>
      </dl>
    </HelpPage>
  );
}

export const meta: Route.MetaFunction = () => [{ title: 'The rig · Valveside' }];
