import type { IncomingMessage, Server as HttpServer } from 'node:http';
import type { RequestHandler } from 'express';
import { Server } from 'socket.io';
import { changedEvent, customerNamespace, hintEvent, signedOutEvent } from '@driprail/shared/realtime/hints';
import type { Hint, HintEntity } from '@driprail/shared/realtime/hints';
import type { SignedIn } from '../http/route.ts';

/** Who hears of a change: those at the desk, owners alone, one person of a crew, or whoever has a job's own page open. */
export type Audience = 'desk' | 'owners' | 'everyone' | { personIds: string[] } | { jobId: string };

/** The job of a customer's link; null for one that is not signed here or has run out. */
export type JobOfToken = (token: string) => Promise<string | null>;

/** Open screens. A hint carries no data: who hears it fetches through the API and gets what they may see. */
export class Hub {
  private io: Server | null = null;

  attach(
    server: HttpServer,
    chain: RequestHandler[],
    isAllowed: (req: IncomingMessage) => boolean,
    jobOf: JobOfToken,
  ): void {
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
    openToCustomers(io, jobOf);
    this.io = io;
  }

  hint(audiences: Audience[], entity: HintEntity, id: string, version = 0): void {
    const rooms = audiences.flatMap((audience) => {
      if (typeof audience === 'string') return [audience];
      return 'personIds' in audience ? audience.personIds.map((p) => `person:${p}`) : [];
    });
    if (rooms.length > 0) this.io?.to(rooms).emit(hintEvent, { entity, id, version } satisfies Hint);
    // Bills are named by their job.
    const jobIds = entity === 'job' || entity === 'bill' ? [id] : [];
    for (const audience of audiences)
      if (typeof audience !== 'string' && 'jobId' in audience) jobIds.push(audience.jobId);
    if (jobIds.length > 0) this.io?.of(customerNamespace).to(jobIds).emit(changedEvent);
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

/** A customer's page is let in by its link alone, hears that its job changed, and is listened to in nothing. */
function openToCustomers(io: Server, jobOf: JobOfToken): void {
  const pages = io.of(customerNamespace);
  pages.use((socket, next) => {
    const token: unknown = socket.handshake.auth['token'];
    void (typeof token === 'string' && token.length <= 80 ? jobOf(token) : Promise.resolve(null)).then(
      (jobId) => {
        if (!jobId) return next(new Error('unauthorized'));
        void socket.join(jobId);
        next();
      },
      () => next(new Error('unauthorized')),
    );
  });
}

function userOf(request: unknown): SignedIn | undefined {
  return (request as { user?: SignedIn }).user;
}

/** One hub per process; features reach it through `hints.ts`. */
export const hub = new Hub();
