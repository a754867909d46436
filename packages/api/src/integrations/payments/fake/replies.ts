import { FakeError } from './fake-objects.ts';

export interface Reply {
  status: number;
  body: object;
  /** True when the work was done before under the same key. */
  isReplay: boolean;
}

/**
 * Idempotency keys as https://docs.stripe.com/api/idempotent_requests says: the first answer is kept, errors too, once
 * the work had begun; the same key with other parameters is an error.
 */
export class Replies {
  readonly #kept = new Map<string, { asked: string; reply: Reply }>();

  /** @param asked method, path and parameters, to be told from another request */
  once(key: string | undefined, asked: string, work: () => object): Reply {
    const known = key === undefined ? undefined : this.#kept.get(key);
    if (known && known.asked !== asked) {
      const message = `Keys for idempotent requests can only be used with the same parameters they were first used with. Try using a key other than '${key}' if you meant to execute a different request.`;
      return { ...failed(new FakeError(400, { type: 'idempotency_error', message })), isReplay: false };
    }
    if (known) return { ...known.reply, isReplay: true };
    try {
      // A copy: what is kept is the answer of that time, whatever becomes of the object.
      return this.#keep(key, asked, { status: 200, body: structuredClone(work()) });
    } catch (error) {
      if (!(error instanceof FakeError)) throw error;
      return error.isKept ? this.#keep(key, asked, failed(error)) : { ...failed(error), isReplay: false };
    }
  }

  #keep(key: string | undefined, asked: string, answer: Omit<Reply, 'isReplay'>): Reply {
    const reply = { ...answer, isReplay: false };
    if (key !== undefined) this.#kept.set(key, { asked, reply });
    return reply;
  }
}

const failed = ({ status, body }: FakeError) => ({ status, body });
