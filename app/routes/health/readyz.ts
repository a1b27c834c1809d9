import { readReadiness } from '~/queries/readiness.server';

/** Ready: the database answers and has every migration that this build knows. */
export async function loader(): Promise<Response> {
  const { ready, detail } = await readReadiness();
  if (ready)
    return Response.json({ status: 'ready' }, { headers: { 'Cache-Control': 'no-store' } });
  return Response.json(
    { type: 'about:blank', title: 'Service Unavailable', status: 503, code: 'not-ready', detail },
    {
      status: 503,
      headers: { 'Content-Type': 'application/problem+json', 'Cache-Control': 'no-store' },
    },
  );
}
