/** Remembers where a fault shows, and frames it. */
export class Extent {
  readonly #columns: Float64Array;
  readonly #rows: Float64Array;
  readonly #width: number;
  readonly #height: number;

  constructor(width: number, height: number) {
    this.#width = width;
    this.#height = height;
    this.#columns = new Float64Array(width);
    this.#rows = new Float64Array(height);
  }

  add(k: number, share: number): void {
    const y = Math.floor(k / this.#width);
    const x = k - y * this.#width;
    this.#columns[x] = (this.#columns[x] as number) + share;
    this.#rows[y] = (this.#rows[y] as number) + share;
  }

  /** How much of the fault shows, in pixels weighed by how plainly. */
  get amount(): number {
    return this.#rows.reduce((sum, w) => sum + w, 0);
  }

  include(other: Extent): void {
    other.#columns.forEach((w, i) => { this.#columns[i] = (this.#columns[i] as number) + w; });
    other.#rows.forEach((w, i) => { this.#rows[i] = (this.#rows[i] as number) + w; });
  }

  /** Box that holds nearly all of the fault, in shares of the picture; undefined when it shows nowhere. */
  box(): { x: number; y: number; width: number; height: number } | undefined {
    const across = middle(this.#columns);
    const down = middle(this.#rows);
    if (!across || !down) return undefined;
    const [left, right] = padded(across, this.#width);
    const [top, bottom] = padded(down, this.#height);
    return { x: left / this.#width, y: top / this.#height, width: (right - left) / this.#width, height: (bottom - top) / this.#height };
  }
}

/** First and last place of the middle 96 % of a distribution. */
function middle(weights: Float64Array): [number, number] | undefined {
  const total = weights.reduce((sum, w) => sum + w, 0);
  if (total < 4) return undefined;
  let sum = 0;
  let first = -1;
  for (let i = 0; i < weights.length; i += 1) {
    sum += weights[i] as number;
    if (first < 0 && sum >= total * 0.02) first = i;
    if (sum >= total * 0.98) return [first, i];
  }
  return [first, weights.length - 1];
}

function padded([from, to]: [number, number], limit: number): [number, number] {
  const pad = Math.max(6, (36 - (to - from)) / 2);
  return [Math.max(0, Math.round(from - pad)), Math.min(limit, Math.round(to + pad))];
}
