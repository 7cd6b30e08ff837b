// Scrubbing and playing the run at its own pace or another.
export class Player {
  playing = false;

  constructor(root, period, go) {
    this.period = period;
    this.go = go;
    this.button = root.querySelector('[data-part="play"]');
    this.slider = root.querySelector('[data-part="scrub"]');
    this.rate = root.querySelector('[data-part="rate"]');
    this.slider.oninput = () => this.go(Number(this.slider.value));
    this.button.onclick = () => this.playing ? this.pause() : this.play();
  }

  play() {
    this.playing = true;
    this.#label();
    const end = Number(this.slider.max);
    let at = Number(this.slider.value) >= end ? 0 : Number(this.slider.value), last = performance.now();
    const tick = now => {
      if (!this.playing) return;
      at += (now - last) / 1000 * Number(this.rate.value) / this.period;
      last = now;
      this.go(Math.min(at, end));
      if (at >= end) this.pause(); else this.next = requestAnimationFrame(tick);
    };
    this.next = requestAnimationFrame(tick);
  }

  pause() {
    this.playing = false;
    cancelAnimationFrame(this.next);
    this.#label();
  }

  stop() { this.pause(); }

  #label() {
    this.button.textContent = this.playing ? "Pause" : "Play";
    this.button.setAttribute("aria-pressed", `${this.playing}`);
  }
}
