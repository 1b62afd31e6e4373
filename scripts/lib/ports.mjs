/** Ports of this machine. */
import { connect, createServer } from 'node:net';

/** Listens for a moment; gives the port, or the code of the error. Port 0 takes any that is free. */
function probe(port, host) {
  return new Promise((resolve) => {
    const server = createServer();
    server.once('error', (error) => resolve({ code: error.code }));
    server.listen(port, host, () => {
      const { port: taken } = server.address();
      server.close(() => resolve({ port: taken }));
    });
  });
}

/** A port on loopback that nobody uses. */
export const freePort = async () => (await probe(0, '127.0.0.1')).port;

/** Null where one can listen on the port, else the code of the error. */
export const hindrance = async (port, host = '127.0.0.1') => (await probe(port, host)).code ?? null;

/** Whether somebody takes connections there. */
export function answers(port) {
  return new Promise((resolve) => {
    const socket = connect({ port, host: '127.0.0.1' });
    const done = (result) => {
      socket.destroy();
      resolve(result);
    };
    socket.setTimeout(2000, () => done(false));
    socket.once('connect', () => done(true));
    socket.once('error', () => done(false));
  });
}
