// One cursor and one window of time for everything on the run page: the map, the charts, the picture and the values follow them.
import { ArmCanvas } from "../arm/scene.js";
import { Charts } from "./charts.js";
import { Moment } from "./moment.js";
import { Player } from "./player.js";
import { SampleSource } from "./samples.js";
import { ScenePath } from "./scene-path.js";
import { UseMap } from "./use-map.js";

const narrowest = 8; // samples

export function start(root) {
  const page = new RunPage(root);
  return { stop: () => page.stop() };
}

class RunPage {
  constructor(root) {
    this.root = root;
    this.count = Number(root.dataset.count);
    this.period = Number(root.dataset.period);
    this.href = root.dataset.href;
    this.lanes = root.querySelector('[data-part="lanes"]');
    this.listening = new AbortController();
    if (!this.lanes.querySelector('[data-part="map"]')) return;
    this.source = new SampleSource(this.href, this.count);
    this.map = new UseMap(root, this.count, this.period);
    this.moment = new Moment(root, this.period);
    this.charts = new Charts(root, JSON.parse(root.querySelector("[data-lanes]").dataset.lanes), this.period, view => this.zoom(view ?? this.whole));
    this.player = new Player(root, this.period, sample => this.point(sample, true));
    this.line = Object.assign(document.createElement("div"), { className: "run-cursor" });
    this.line.setAttribute("aria-hidden", "true");
    this.lanes.append(this.line);
    this.whole = [-0.5, this.count - 0.5];
    this.view = this.whole;
    this.pinned = this.cursor = this.#fromAddress() ?? Number(root.dataset.start);
    this.#listen();
    this.resizing = new ResizeObserver(() => this.#layOut());
    this.resizing.observe(this.map.axis);
    this.zoom(this.whole);
    this.point(this.cursor, true);
    this.#load();
  }

  stop() {
    this.listening.abort();
    for (const part of [this.source, this.charts, this.player, this.scene]) part?.stop();
    this.resizing?.disconnect();
    this.line?.remove();
    clearTimeout(this.fetching);
  }

  // Moves the cursor; pins it there when the reader chose the place and did not just pass over it.
  point(sample, pin = false) {
    const k = Math.min(Math.max(Math.round(sample), 0), this.count - 1);
    if (pin) this.pinned = k;
    this.cursor = k;
    if (pin) this.#remember();
    this.frame ??= requestAnimationFrame(() => { this.frame = null; this.#show(); });
  }

  zoom([from, to]) {
    const span = Math.min(Math.max(to - from, narrowest), this.count);
    const middle = Math.min(Math.max((from + to) / 2, span / 2 - 0.5), this.count - 0.5 - span / 2);
    this.view = [middle - span / 2, middle + span / 2];
    this.root.dataset.view = this.view.map(v => Math.round(v)).join(" ");
    this.map.zoom(this.view);
    this.charts.zoom(this.view);
    this.#layOut();
    clearTimeout(this.fetching);
    this.fetching = setTimeout(() => this.#fetchWindow(), this.data ? 90 : 0);
  }

  async #load() {
    try {
      const [bins, scene] = [this.source.bins(), this.source.scene()];
      this.map.setBins(await bins);
      this.map.describe(this.cursor);
      this.sceneData = await scene;
      this.scene = new ArmCanvas(this.root.querySelector('[data-part="scene"]'), this.sceneData.about.drawing);
      this.path = new ScenePath(this.scene, this.sceneData, this.map.rows, this.count);
      this.path.colour(this.root.querySelector('[data-part="colour"]').value);
      this.scene.view("cell");
      this.#layOut();
      this.#show();
      this.root.dataset.samples = "here";
    } catch (error) {
      this.#failed(error);
    }
  }

  async #fetchWindow() {
    this.windowStop?.abort();
    this.windowStop = new AbortController();
    const [from, to] = this.view;
    const width = this.#plot().width || 600;
    try {
      const names = [...this.charts.columns, ...this.map.rows.map(r => r.column)];
      const data = await this.source.window(Math.max(Math.floor(from), 0), Math.min(Math.ceil(to) + 1, this.count), Math.max(Math.ceil(width), 200), names, this.windowStop.signal);
      this.data = data;
      this.charts.setData(data.columns);
      this.map.refine(data);
      this.root.dataset.window = `${data.about.from} ${data.about.to}`;
    } catch (error) {
      this.#failed(error);
    }
  }

  #show() {
    const k = this.cursor, [from, to] = this.view, plot = this.#plot();
    const share = (k - from) / (to - from);
    this.line.hidden = share < 0 || share > 1;
    this.line.style.transform = `translateX(${plot.left + share * plot.width}px)`;
    this.root.dataset.cursor = `${k}`;
    this.moment.place(k, this.#mark(k));
    if (this.map.edges) this.map.describe(k);
    this.path?.pose(k);
    const known = this.source.known(k);
    if (known) this.#fill(known);
    else {
      this.moment.wait();
      clearTimeout(this.asking);
      this.asking = setTimeout(() => this.source.need(k).then(at => { if (at && this.cursor === k) this.#fill(at); }, error => this.#failed(error)), this.filled ? 40 : 0);
    }
  }

  #fill(at) {
    this.filled = true;
    this.root.querySelector('[data-part="trouble"]').hidden = true;
    const { joint } = this.moment.fill(at);
    this.path?.pose(this.cursor, at, joint);
    this.root.dataset.filled = `${this.cursor}`;
  }

  #mark(k) {
    const mark = this.sceneData?.about.marks.find(m => m.sample === k);
    return mark && (mark.label ? `at “${mark.label}”` : `at waypoint ${mark.waypoint + 1}`);
  }

  #plot() {
    const axis = this.map.axis.getBoundingClientRect();
    return { left: axis.left - this.lanes.getBoundingClientRect().left, width: axis.width, client: axis.left };
  }

  #layOut() {
    this.map.marks(this.view, this.#plot().width, this.sceneData);
    this.#show();
  }

  #sampleAt(event) {
    const plot = this.#plot();
    const share = (event.clientX - plot.client) / plot.width;
    return share < 0 || share > 1 ? null : this.view[0] + share * (this.view[1] - this.view[0]);
  }

  // Passing over a place shows it; leaving goes back to the place the reader chose.
  #glance(sample) {
    const k = sample === null ? this.pinned : Math.round(sample);
    if (k !== this.cursor && !this.player.playing) this.point(k);
  }

  #under(event) {
    const sample = this.#sampleAt(event);
    if (sample === null || !event.target.closest(".run-plot, .run-chart, .run-plot-axis")) return null;
    const row = this.map.rowOf(event.target);
    return row && this.map.edges ? this.map.worstAt(row, sample) : sample;
  }

  #listen() {
    const on = (target, name, handle) => target.addEventListener(name, handle, { signal: this.listening.signal });
    on(this.lanes, "pointermove", e => {
      if (e.pointerType === "mouse" && !e.buttons && !this.player.playing) this.#glance(this.#under(e));
    });
    on(this.lanes, "pointerleave", () => this.#glance(null));
    on(this.lanes, "click", e => { const sample = this.#under(e); if (sample !== null) this.point(sample, true); });
    on(this.root, "click", e => this.#follow(e));
    on(this.root, "keydown", e => this.#key(e));
    on(window, "hashchange", () => { const sample = this.#fromAddress(); if (sample !== null) this.#reach(sample); });
    on(this.root.querySelector('[data-part="colour"]'), "change", e => this.path?.colour(e.target.value));
  }

  // Links to places, and the zoom buttons.
  #follow(event) {
    const target = event.target.closest("[data-sample], [data-zoom]");
    if (!target) return;
    const { from, to, sample, zoom } = target.dataset;
    if (zoom) {
      const [a, b] = this.view, factor = zoom === "in" ? 0.4 : 2.5;
      this.zoom(zoom === "all" ? this.whole : [this.cursor - (this.cursor - a) * factor, this.cursor + (b - this.cursor) * factor]);
      return;
    }
    if (sample === "" || event.ctrlKey || event.metaKey) return;
    event.preventDefault();
    if (from) {
      const room = Math.max((to - from) * 0.4, 25);
      this.zoom([from - room, Number(to) + room]);
    }
    this.#reach(Number(sample));
  }

  #reach(sample) {
    const [a, b] = this.view;
    if (sample < a || sample > b) this.zoom([sample - (b - a) / 2, sample + (b - a) / 2]);
    this.point(sample, true);
    this.root.querySelector('[data-part="moment"]').scrollIntoView({ block: "nearest" });
  }

  #key(event) {
    const row = this.map.rowOf(event.target);
    if (!row || !this.map.edges || event.ctrlKey || event.metaKey || event.altKey) return;
    const go = bins => event.shiftKey ? this.cursor + Math.sign(bins) : this.map.walk(row, this.cursor, bins);
    const keys = {
      ArrowLeft: () => go(-1), ArrowRight: () => go(1), PageUp: () => go(20), PageDown: () => go(-20), Home: () => 0, End: () => this.count - 1,
      ArrowUp: () => this.#row(row, -1), ArrowDown: () => this.#row(row, 1), "+": () => this.#step("in"), "-": () => this.#step("out"),
    };
    if (!keys[event.key]) return;
    event.preventDefault();
    const sample = keys[event.key]();
    if (sample !== undefined) this.point(sample, true);
  }

  #row(row, by) { this.map.rows[this.map.rows.indexOf(row) + by]?.element.focus(); }

  #step(way) { this.root.querySelector(`[data-zoom="${way}"]`).click(); }

  #fromAddress() {
    const time = Number(new URLSearchParams(location.hash.slice(1)).get("t") ?? NaN);
    return Number.isFinite(time) ? Math.min(Math.max(Math.round(time / this.period), 0), this.count - 1) : null;
  }

  #remember() {
    const href = `${this.href}#t=${Number((this.pinned * this.period).toFixed(4))}`;
    this.root.querySelector('[data-part="link"]').href = href;
    clearTimeout(this.remembering);
    // The browser limits how often an address may change.
    this.remembering = setTimeout(() => { if (!this.listening.signal.aborted && this.moved) history.replaceState(history.state, "", href); this.moved = true; }, 250);
  }

  #failed(error) {
    if (error.name === "AbortError") return;
    const note = this.root.querySelector('[data-part="trouble"]');
    note.hidden = false;
    note.querySelector("span").textContent = error.message;
  }
}
