// Fetches and unpacks the samples of a run: bytes with a short header, columns as typed arrays over them.
export function unpack(buffer) {
  const size = new DataView(buffer).getUint32(0, true);
  const { about, columns } = JSON.parse(new TextDecoder().decode(new Uint8Array(buffer, 4, size)));
  const body = 4 + size, found = new Map();
  for (const { name, at, count, whole, thinned } of columns)
    found.set(name, thinned
      ? { samples: new Int32Array(buffer, body + at, count), values: new Float32Array(buffer, body + at + 4 * count, count) }
      : whole ? { samples: new Int32Array(buffer, body + at, count) } : { values: new Float32Array(buffer, body + at, count) });
  return { about, columns: found };
}

const blockSize = 256;
const blocksKept = 80;

export class SampleSource {
  #blocks = new Map();
  #stop = new AbortController();

  constructor(href, count) {
    this.href = `${href}/samples`;
    this.count = count;
  }

  bins() { return this.#get("bins"); }

  scene() { return this.#get("scene"); }

  // Columns over [from, to), thinned so that no peak is lost.
  window(from, to, bins, names, signal) {
    return this.#get(`window?from=${from}&to=${to}&bins=${bins}&names=${encodeURIComponent(names.join(","))}`, signal);
  }

  // Every value at a sample, or null while it is not here yet.
  known(sample) {
    const block = this.#blocks.get(Math.floor(sample / blockSize));
    return block?.columns ? name => block.columns.get(name)?.values[sample - block.about.from] : null;
  }

  async need(sample) {
    const number = Math.floor(sample / blockSize);
    if (!this.#blocks.has(number)) {
      const coming = this.#get(`block?from=${number * blockSize}&count=${blockSize}`);
      this.#blocks.set(number, coming);
      try {
        this.#blocks.set(number, await coming);
      } catch (error) {
        this.#blocks.delete(number);
        throw error;
      }
      if (this.#blocks.size > blocksKept) this.#blocks.delete(this.#blocks.keys().next().value);
    }
    await this.#blocks.get(number);
    return this.known(sample);
  }

  stop() { this.#stop.abort(); }

  async #get(path, signal) {
    const response = await fetch(`${this.href}/${path}`, { signal: signal ? AbortSignal.any([signal, this.#stop.signal]) : this.#stop.signal, credentials: "same-origin" });
    if (response.redirected) throw new Error("You are signed out.");
    if (response.status === 409) throw new Error(await response.text());
    if (!response.ok) throw new Error(`The portal answered ${response.status}.`);
    return unpack(await response.arrayBuffer());
  }
}
