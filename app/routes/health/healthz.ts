/** Alive: the process answers. It asks no database, so a restart is not the cure for an outage. */
export function loader(): Response {
  return Response.json({ status: 'alive' }, { headers: { 'Cache-Control': 'no-store' } });
}
