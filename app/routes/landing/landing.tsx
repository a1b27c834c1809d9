import { Link } from 'react-router';
import { ButtonLink } from '~/components/button';
import { deference } from '~/components/caution-words';
import { PageShell } from '~/components/shell/page-shell';
import type { Route } from './+types/landing';
import { LandingLevel } from './landing-level';

export default function Landing() {
  return (
    <PageShell>
      <div className="landing">
        <div>
          <h1>Know when your coach’s own air is higher than your tire’s</h1>
          <p className="lead">
            Valveside tells you when to put the chuck on, how long to keep it there, and when to
            take it off.
          </p>
          <div className="actions">
            <ButtonLink kind="main" to="/practice">
              Practise a fill
            </ButtonLink>
            <Link to="/login">Sign in for your own coach</Link>
          </div>
          <p className="landing-more">
            Practice needs no account and saves nothing. Your own coach needs an e-mail address.
          </p>
        </div>
        <LandingLevel />
      </div>
      <section className="landing-facts">
        <div>
          <h2>A level and a line</h2>
          <p>
            The level is the coach’s supply. The line is your tire. Filled above the line is
            headroom; hatched below it is what is missing.
          </p>
        </div>
        <div>
          <h2>From what you tap</h2>
          <p>
            It asks for your gauge when it has to, and works out supply, tire and time from that. It
            measures nothing by itself.
          </p>
        </div>
        <div>
          <h2>It knows its limits</h2>
          <p>
            It says so when it is not sure, and when a governor will not reach a target. {deference}{' '}
            <Link to="/help/safety">Read the safety page</Link>
          </p>
        </div>
      </section>
    </PageShell>
  );
}

export const meta: Route.MetaFunction = () => [
  { title: 'Valveside' },
  {
    name: 'description',
    content:
      'Tells you when your coach’s own air is higher than your tire’s, and how long to keep the chuck on.',
  },
];
