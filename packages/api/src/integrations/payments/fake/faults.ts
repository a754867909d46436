export interface Fault {
  /** Before: nothing was done and the answer is 500. After: all was done, and the line breaks instead of an answer. */
  when: 'before' | 'after';
  times: number;
}

/** Troubles on order: the next requests to the service fail. */
export class Faults {
  #next: Fault | null = null;

  order(fault: Fault): void {
    this.#next = fault;
  }

  take(): Fault['when'] | null {
    const fault = this.#next;
    if (!fault) return null;
    this.#next = fault.times > 1 ? { ...fault, times: fault.times - 1 } : null;
    return fault.when;
  }
}
