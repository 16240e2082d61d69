/** Numbers that come one at a time, in a typed array that grows: eight bytes each, where objects would take fifty. */
export class NumberList {
  length = 0;
  #values = new Float64Array(1024);

  push(value: number): void {
    if (this.length === this.#values.length) {
      const larger = new Float64Array(this.length * 2);
      larger.set(this.#values);
      this.#values = larger;
    }
    this.#values[this.length++] = value;
  }

  /** The numbers so far; a view that the next `push` may leave behind. */
  view(): Float64Array {
    return this.#values.subarray(0, this.length);
  }
}
