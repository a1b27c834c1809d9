import { PassThrough } from 'node:stream';
import { createReadableStreamFromReadable } from '@react-router/node';
import { isbot } from 'isbot';
import { renderToPipeableStream } from 'react-dom/server';
import type { EntryContext, HandleErrorFunction, RouterContextProvider } from 'react-router';
import { isRouteErrorResponse, ServerRouter } from 'react-router';
import { requireEnv } from '~/env.server';
import { log } from '~/services/log.server';
import { nonceContext } from '~/services/security-headers.server';
import { armShutdown } from '~/services/shutdown.server';

requireEnv();
armShutdown();

/** Milliseconds after which a page that has not finished streaming is given up. */
export const streamTimeout = 10_000;

export default function handleRequest(
  request: Request,
  status: number,
  headers: Headers,
  entryContext: EntryContext,
  context: RouterContextProvider,
) {
  const nonce = context.get(nonceContext);
  const waitForAll = isbot(request.headers.get('user-agent') ?? '') || entryContext.isSpaMode;
  return new Promise<Response>((resolve, reject) => {
    let shellSent = false;
    const { pipe, abort } = renderToPipeableStream(
      <ServerRouter context={entryContext} url={request.url} nonce={nonce} />,
      {
        nonce,
        [waitForAll ? 'onAllReady' : 'onShellReady']() {
          shellSent = true;
          const body = new PassThrough();
          headers.set('Content-Type', 'text/html; charset=utf-8');
          resolve(new Response(createReadableStreamFromReadable(body), { headers, status }));
          pipe(body);
        },
        onShellError: reject,
        onError(error: unknown) {
          // Before the shell is sent the promise rejects and the error is logged there.
          if (shellSent) log.error({ err: error }, 'page failed while streaming');
        },
      },
    );
    setTimeout(abort, streamTimeout + 1000).unref();
  });
}

export const handleError: HandleErrorFunction = (error, { request }) => {
  if (request.signal.aborted || isRouteErrorResponse(error)) return;
  log.error({ err: error, path: new URL(request.url).pathname }, 'request failed');
};
