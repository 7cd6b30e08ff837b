// The linked charts. The circuit makes them, empty; their samples, colours and common window of time are set here.
import { tokenColour, onThemeChange } from "../tokens.js";

const hues = 8;
const dashes = ["solid", "solid", "solid", "dash", "dash", "dash", "dot", "dot"];

export class Charts {
  constructor(root, lanes, period, zoomed) {
    this.root = root;
    this.lanes = lanes;
    this.period = period;
    this.zoomed = zoomed;
    this.ready = new Map();
    this.painted = 0;
    this.#colour();
    this.forget = onThemeChange(() => { this.#colour(); this.#paintAll(); });
    this.watch = new MutationObserver(() => this.#adopt());
    this.watch.observe(root, { childList: true, subtree: true, attributes: true, attributeFilter: ["class"] });
    this.#adopt();
  }

  get columns() { return [...new Set(this.lanes.flatMap(lane => lane.lines.map(line => line.column)))]; }

  zoom(view) {
    this.view = view;
    for (const [, plot] of this.ready) this.#range(plot);
  }

  setData(columns) {
    this.data = columns;
    this.#paintAll();
  }

  stop() {
    this.watch.disconnect();
    this.forget();
  }

  #range(plot) {
    const range = this.view.map(sample => sample * this.period);
    if (plot.layout.xaxis?.range?.every((value, i) => Math.abs(value - range[i]) < 1e-9)) return;
    window.Plotly.relayout(plot, { "xaxis.range": range });
  }

  // A chart may be met while it is still being made; what it is given then is lost. Its ticks are the last thing drawn.
  #adopt() {
    for (const lane of this.lanes) {
      const plot = this.root.querySelector(`[data-chart="${lane.id}"] .js-plotly-plot`);
      if (!plot?.on || !plot.querySelector(".xtick") || this.ready.get(lane.id) === plot) continue;
      this.ready.set(lane.id, plot);
      setTimeout(() => {
        plot.on("plotly_relayout", change => this.#relaid(change));
        plot.on("plotly_doubleclick", () => this.zoomed(null));
        this.#paint(lane, plot);
        this.root.dataset.charts = `${++this.painted}`;
      });
    }
  }

  #relaid(change) {
    const from = change["xaxis.range[0]"], to = change["xaxis.range[1]"];
    if (from !== undefined && to !== undefined) this.zoomed([from / this.period, to / this.period]);
  }

  #colour() {
    this.colours = {
      lines: Array.from({ length: hues }, (_, i) => tokenColour(`--line-${i}`)), limit: tokenColour("--use-over"), grid: tokenColour("--line-soft"), ink: tokenColour("--ink-2"),
    };
  }

  #paintAll() { for (const lane of this.lanes) if (this.ready.has(lane.id)) this.#paint(lane, this.ready.get(lane.id)); }

  #paint(lane, plot) {
    const { lines, limit, grid, ink } = this.colours;
    const window_ = (this.view ?? [0, 1]).map(sample => sample * this.period);
    const x = [], y = [], colour = [], dash = [], width = [], mode = [];
    for (const line of lane.lines) {
      const column = this.data?.get(line.column);
      x.push(column ? Float64Array.from(column.samples, k => k * this.period) : []);
      y.push(column ? shown(column.values) : []);
      colour.push(lines[line.hue % hues]);
      dash.push(dashes[line.hue % hues]);
      width.push(1.5);
      // Zoomed in far enough, every sample shows as the point it is.
      mode.push(column && column.samples.length < 120 ? "lines+markers" : "lines");
    }
    for (const { value } of lane.limits) {
      x.push(window_);
      y.push([value, value]);
      colour.push(limit);
      dash.push("5px,3px");
      width.push(1.5);
      mode.push("lines");
    }
    const axis = { gridcolor: grid, linecolor: grid, tickfont: { color: ink, size: 11 } };
    plot.dataset.points = `${x[0]?.length ?? 0}`;
    window.Plotly.update(plot, { x, y, mode, "line.color": colour, "line.dash": dash, "line.width": width, "marker.size": x.map(() => 3.5), "marker.color": colour }, {
      "xaxis.range": window_, "xaxis.gridcolor": grid, "xaxis.tickfont": axis.tickfont, "yaxis.gridcolor": grid, "yaxis.tickfont": axis.tickfont, "yaxis.zeroline": false,
    });
  }
}

// A value without bound would leave a gap where the worst is; it is drawn above everything else instead.
function shown(values) {
  if (!values.some(v => v === Infinity)) return values;
  let most = 1;
  for (const v of values) if (Number.isFinite(v) && v > most) most = v;
  return values.map(v => v === Infinity ? most * 2 : v);
}
