/** Thrown where work would go on although the program is being stopped. */
export class Stopped extends Error {}

/**
 * What a running program holds (its lock, the database, children) and gives back, last taken first.
 */
export class Lifetime {
  /** @type {(() => Promise<void> | void)[]} */
  #releases = [];
  /** @type {Promise<void> | null} */
  #stopping = null;

  isStopping() {
    return this.#stopping !== null;
  }

  /** Call before something new is started: throws {@link Stopped} once the program is being stopped. */
  checkpoint() {
    if (this.isStopping()) throw new Stopped('The program is being stopped.');
  }

  /**
   * @param {() => Promise<void> | void} release
   * @returns {() => void} forgets the release, for what has ended by itself
   */
  hold(release) {
    this.#releases.push(release);
    return () => {
      this.#releases = this.#releases.filter((other) => other !== release);
    };
  }

  /** Gives everything back; a second call waits for the first. */
  stop() {
    this.#stopping ??= this.#releaseAll();
    return this.#stopping;
  }

  async #releaseAll() {
    for (let release = this.#releases.pop(); release; release = this.#releases.pop()) {
      try {
        await release();
      } catch (error) {
        process.stderr.write(`While stopping: ${String(error)}\n`);
      }
    }
  }
}
