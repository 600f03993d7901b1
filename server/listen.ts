import type { Server } from 'node:http';

/** The port cannot be listened on; its message is one clear sentence. */
export class PortRefused extends Error {}

/** Listens on a port (0: any free one). */
export function listenOn(server: Server, port: number): Promise<void> {
  return new Promise((resolve, reject) => {
    server.once('error', (error: NodeJS.ErrnoException) => {
      reject(
        new PortRefused(
          error.code === 'EADDRINUSE'
            ? `Port ${port} is taken by another program; stop that one or set PORT to another number.`
            : `Port ${port} cannot be listened on (${error.code ?? 'unknown reason'}); set PORT to another number.`,
        ),
      );
    });
    server.listen(port, () => resolve());
  });
}
