import { server } from './server';

/** Fails once with plain words when the app does not answer, instead of in every test. */
export default async function setup(): Promise<void> {
  const answer = await fetch(new URL('/readyz', server.url));
  if (!answer.ok) throw new Error(`The app is not ready: ${answer.status} ${await answer.text()}`);
}
