import type { IncomingMessage, Server as HttpServer } from 'node:http';
import type { RequestHandler } from 'express';
import { Server } from 'socket.io';
import { hintEvent, signedOutEvent } from '@driprail/shared/realtime/hints';
import type { Hint, HintEntity } from '@driprail/shared/realtime/hints';
import type { SignedIn } from '../http/route.ts';

/** Who hears of a change: those at the desk, owners alone, or one person of a crew. */
export type Audience = 'desk' | 'owners' | 'everyone' | { personIds: string[] };

/** Open screens. A hint carries no data: who hears it fetches through the API and gets what they may see. */
export class Hub {
  private io: Server | null = null;

  attach(server: HttpServer, chain: RequestHandler[], isAllowed: (req: IncomingMessage) => boolean): void {
    const io = new Server(server, { serveClient: false, allowRequest: (req, done) => done(null, isAllowed(req)) });
    for (const step of chain) {
      io.engine.use((req: { _query?: { sid?: string } }, res: unknown, next: () => void) =>
        req._query?.sid === undefined ? void step(req as never, res as never, next) : next(),
      );
    }
    io.use((socket, next) => (userOf(socket.request) ? next() : next(new Error('unauthorized'))));
    io.on('connection', (socket) => {
      const user = userOf(socket.request);
      const sessionId = (socket.request as { session?: { id: string } }).session?.id;
      if (!user || !sessionId) return;
      void socket.join(['everyone', `user:${user.id}`, `session:${sessionId}`]);
      if (user.role !== 'technician') void socket.join('desk');
      if (user.role === 'owner') void socket.join('owners');
      if (user.personId) void socket.join(`person:${user.personId}`);
    });
    this.io = io;
  }

  hint(audiences: Audience[], entity: HintEntity, id: string, version = 0): void {
    const rooms = audiences.flatMap((audience) =>
      typeof audience === 'string' ? [audience] : audience.personIds.map((p) => `person:${p}`),
    );
    if (rooms.length > 0) this.io?.to(rooms).emit(hintEvent, { entity, id, version } satisfies Hint);
  }

  /** Whether a person has the app open somewhere. */
  isOpen(personId: string): boolean {
    return (this.io?.sockets.adapter.rooms.get(`person:${personId}`)?.size ?? 0) > 0;
  }

  /** Ends the screens of a session or of all of a user's sessions. */
  signOut(room: `session:${string}` | `user:${string}`): void {
    this.io?.to(room).emit(signedOutEvent);
    this.io?.in(room).disconnectSockets(true);
  }

  async close(): Promise<void> {
    await this.io?.close();
    this.io = null;
  }
}

function userOf(request: unknown): SignedIn | undefined {
  return (request as { user?: SignedIn }).user;
}

/** One hub per process; features reach it through `hints.ts`. */
export const hub = new Hub();
