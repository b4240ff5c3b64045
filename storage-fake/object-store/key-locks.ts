/** Runs tasks of the same name one after another; tasks of different names side by side. */
export class KeyLocks {
  private readonly tails = new Map<string, Promise<unknown>>();

  async run<T>(name: string, task: () => Promise<T>): Promise<T> {
    const before = this.tails.get(name) ?? Promise.resolve();
    // A failure belongs to the caller of that task; the next one starts either way.
    const result = before.then(task, task);
    this.tails.set(name, result);
    try {
      return await result;
    } finally {
      if (this.tails.get(name) === result) this.tails.delete(name);
    }
  }
}
