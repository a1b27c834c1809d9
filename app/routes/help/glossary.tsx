import type { Route } from './+types/glossary';
import { HelpPage } from './help-page';

const tradeWords: readonly (readonly [string, string])[] = [
  ['Supply', 'The coach’s own compressed air, and the first tank that it goes to.'],
  ['Governor', 'The switch that starts and rests the compressor by the supply’s pressure.'],
  ['Cut-in', 'The pressure at which the compressor starts to pump.'],
  ['Cut-out', 'The pressure at which it stops pumping.'],
  ['Purge', 'The hiss of the air drier at cut-out, when it blows its water out.'],
  ['Fast idle', 'A raised engine speed at rest. The compressor turns faster with it.'],
  ['Brake application', 'One press of the brake pedal. It takes a little air each time.'],
  ['Air chuck', 'The end of the hose that opens the valve of a tire.'],
  ['Valve stem, valve core', 'The tire’s valve, and the small spring-loaded part inside it.'],
  ['Cold pressure', 'Parked three hours or more, or driven under a mile.'],
  ['Load and inflation table', 'The tire maker’s list of the pressure that each load needs.'],
  [
    'Steer, drive, tag axle',
    'The front axle, the driven one, and the one behind it if there is one.',
  ],
  ['Dual', 'Two tires side by side at one end of an axle.'],
  ['GAWR', 'Gross axle weight rating: the most that an axle may carry.'],
  ['Weigh ticket', 'The paper of a scale.'],
  ['Bleed', 'To let air out on purpose.'],
];

const ownWords: readonly (readonly [string, string])[] = [
  ['Call', 'What you should do now.'],
  [
    'Level',
    'The live screen’s picture: the supply as a level that rises and falls, the tire as a line across it.',
  ],
  ['Headroom', 'Supply less tire.'],
  ['Air profile', 'What has been learned about one coach’s supply.'],
  ['Round', 'One walk round the coach: the cold check and the fills that follow.'],
  ['Fill', 'One tire, from the first reading to the proof.'],
  ['Practice', 'A fill on a simulated coach, alone.'],
];

export default function Glossary() {
  return (
    <HelpPage title="Words">
      <h2>Of the trade</h2>
      <Terms terms={tradeWords} />
      <h2>Of this product</h2>
      <Terms terms={ownWords} />
    </HelpPage>
  );
}

function Terms({ terms }: { terms: readonly (readonly [string, string])[] }) {
  return (
    <dl className="terms">
      {terms.map(([term, meaning]) => (
        <div key={term}>
          <dt>{term}</dt>
          <dd>{meaning}</dd>
        </div>
      ))}
    </dl>
  );
}

export const meta: Route.MetaFunction = () => [{ title: 'Words · Valveside' }];
