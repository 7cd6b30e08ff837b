// <page-module src="js/x.js"> runs the module's start(element) whenever the element appears, by a full load or by enhanced navigation, where
// plain script elements do not run. start returns { stop, update } or nothing; update is called when data-value changes.
class PageModule extends HTMLElement {
  static observedAttributes = ["src", "data-key", "data-value"];
  #running = 0;
  #handle = null;

  connectedCallback() { this.#restart(); }

  disconnectedCallback() { this.#stop(); }

  attributeChangedCallback(name, before, after) {
    if (before === null || before === after || !this.isConnected) return;
    if (name === "data-value") this.#handle?.update?.(after);
    else this.#restart();
  }

  async #restart() {
    this.#stop();
    const turn = this.#running;
    const module = await import(new URL(this.getAttribute("src"), document.baseURI));
    if (turn !== this.#running || !this.isConnected) return;
    this.#handle = module.start(this) ?? null;
  }

  #stop() {
    this.#running++;
    this.#handle?.stop?.();
    this.#handle = null;
  }
}

if (!customElements.get("page-module")) customElements.define("page-module", PageModule);
