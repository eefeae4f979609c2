import type { BrowserContext } from '@playwright/test';

/** Collects every request that leaves the page's own origin (blob: and data: stay inside the page). */
export function watchOrigin(context: BrowserContext, origin: string): string[] {
  const foreign: string[] = [];
  const note = (url: string) => {
    if (/^(blob|data|about):/.test(url)) return;
    if (new URL(url).origin !== new URL(origin).origin) foreign.push(url);
  };
  context.on('request', (request) => note(request.url()));
  context.on('page', (page) => page.on('websocket', (socket) => note(socket.url())));
  return foreign;
}
