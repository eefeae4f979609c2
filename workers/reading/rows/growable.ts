/** A column of doubles that grows by doubling. */
export class GrowingFloats {
  length = 0;
  private room = new Float64Array(16);

  push(value: number): void {
    if (this.length === this.room.length) {
      const wider = new Float64Array(this.room.length * 2);
      wider.set(this.room);
      this.room = wider;
    }
    this.room[this.length++] = value;
  }

  /** The values so far; shares memory with the column. */
  view(): Float64Array {
    return this.room.subarray(0, this.length);
  }
}

/** A column of 32-bit whole numbers that grows by doubling. */
export class GrowingInts {
  length = 0;
  private room = new Int32Array(16);

  push(value: number): void {
    if (this.length === this.room.length) {
      const wider = new Int32Array(this.room.length * 2);
      wider.set(this.room);
      this.room = wider;
    }
    this.room[this.length++] = value;
  }

  view(): Int32Array {
    return this.room.subarray(0, this.length);
  }
}
