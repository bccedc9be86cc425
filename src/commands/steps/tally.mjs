// @ts-check

/** @typedef {{ passed: number, failed: number }} Tally */

/**
 * Counts a run and prints `N passed, N failed` as the last line of stdout on every way out of the process: its end,
 * `process.exit`, an error nobody caught, or an event loop that ran dry while a step was still open.
 */
export class RunningTally {
  passed = 0;
  failed = 0;
  /** @type {Set<string>} */
  #open = new Set();

  constructor() {
    process.on('uncaughtException', (error) => {
      console.error(error);
      process.exit(1);
    });
    process.on('exit', () => this.#close());
  }

  /** @param {string} name */
  open(name) {
    this.#open.add(name);
  }

  /**
   * @param {string} name of a step that was open
   * @param {Tally} counted
   */
  add(name, { passed, failed }) {
    this.passed += passed;
    this.failed += failed;
    this.#open.delete(name);
  }

  #close() {
    for (const name of this.#open) {
      console.log(`  ${name} did not come to its end`);
      this.failed += 1;
    }
    if (this.passed === 0 && this.failed === 0) this.failed = 1;
    process.exitCode = this.failed === 0 ? 0 : 1;
    console.log(`${this.passed} passed, ${this.failed} failed`);
  }
}
