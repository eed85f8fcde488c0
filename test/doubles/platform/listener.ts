import { createServer, type IncomingHttpHeaders } from 'node:http';
import { makeTray } from './tray.ts';
import { bodyOf } from './webApi.ts';

export type Request = { readonly headers: IncomingHttpHeaders; readonly body: string };

/** An app's public address that notes every request and answers with the status it is told to. */
export const startListener = async () => {
  const requests = makeTray<Request>('requests');
  let status = 200;
  const server = createServer(async (request, response) => {
    requests.add({ headers: request.headers, body: (await bodyOf(request)).toString() });
    response.writeHead(status).end();
  });
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  const address = server.address();
  return {
    requests,
    url: `http://127.0.0.1:${typeof address === 'object' ? address?.port : ''}/`,
    answerWith: (next: number): void => {
      status = next;
    },
    stop: async (): Promise<void> => {
      server.closeAllConnections();
      await new Promise((resolve) => server.close(resolve));
    },
  };
};
