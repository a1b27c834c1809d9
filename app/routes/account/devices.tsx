import { Form } from 'react-router';
import { Button } from '~/components/button';

export interface DeviceRow {
  id: string;
  /** The browser that shows this page. */
  here: boolean;
  words: string;
  seen: string;
  since: string;
}

/** The browsers that are signed in, each with a way to end it. */
export function Devices({ devices }: { devices: readonly DeviceRow[] }) {
  return (
    <section className="hair mt-10 grid gap-4 pt-6">
      <h2>Where you are signed in</h2>
      <ul>
        {devices.map((device) => (
          <li key={device.id} className="hair flex flex-wrap items-center gap-x-6 gap-y-2 py-3">
            <div className="min-w-56 flex-1">
              <p className="font-bold">{device.words}</p>
              <p className="quiet">
                Signed in {device.since}. {device.here ? 'This browser.' : `Seen ${device.seen}.`}
              </p>
            </div>
            {!device.here && <EndOne device={device} />}
          </li>
        ))}
      </ul>
      {devices.length > 1 && (
        <Form method="post">
          <Button name="intent" value="end-others">
            Sign out everywhere else
          </Button>
        </Form>
      )}
    </section>
  );
}

function EndOne({ device }: { device: DeviceRow }) {
  return (
    <Form method="post">
      <input type="hidden" name="sessionId" value={device.id} />
      <Button
        kind="small"
        name="intent"
        value="end-one"
        aria-label={`Sign out ${device.words}, signed in ${device.since}`}
      >
        Sign out
      </Button>
    </Form>
  );
}
