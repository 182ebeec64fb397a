import { connect, createServer, type AddressInfo, type Socket } from 'node:net';

export type HaltingLine = {
  /** The database's address by way of this line. */
  readonly url: string;
  /** From now on no byte passes, and nobody is told: as when the server hangs. */
  readonly halt: () => void;
  /** What was held back passes, and all that follows. */
  readonly goOn: () => void;
  readonly end: () => void;
};

/** A line to a database server that can be halted without the server or its other callers noticing. */
export async function openHaltingLine(databaseUrl: string): Promise<HaltingLine> {
  const to = new URL(databaseUrl);
  const sockets = new Set<Socket>();
  const life = { halted: false };
  const hold = (socket: Socket): void => {
    sockets.add(socket);
    socket.once('close', () => sockets.delete(socket)).on('error', () => undefined);
    if (life.halted) socket.pause();
  };
  const server = createServer((caller) => {
    const line = connect(Number(to.port), to.hostname);
    caller.pipe(line);
    line.pipe(caller);
    hold(caller);
    hold(line);
  });
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  const url = new URL(databaseUrl);
  url.hostname = '127.0.0.1';
  url.port = String((server.address() as AddressInfo).port);
  return {
    url: url.href,
    halt() {
      life.halted = true;
      for (const socket of sockets) socket.pause();
    },
    goOn() {
      life.halted = false;
      for (const socket of sockets) socket.resume();
    },
    end() {
      server.close();
      for (const socket of sockets) socket.destroy();
    },
  };
}
