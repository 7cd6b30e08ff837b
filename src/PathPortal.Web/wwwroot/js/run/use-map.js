// The limit-use map: pointing at a bin means its worst sample; zooming narrows the rows and redraws them from samples.
import { number, step, useLook, useText } from "./format.js";

const height = 30, fullUse = 1.5, limitLine = 10;

export class UseMap {
  constructor(root, count, period) {
    this.count = count;
    this.period = period;
    this.axis = root.querySelector('[data-part="axis"]');
    this.rows = [...root.querySelectorAll(".run-plot[data-row]")].map(e => ({
      element: e, svg: e.querySelector("svg"), near: Number(e.dataset.near), column: `use.${e.dataset.criterion}`, drawn: [...e.querySelectorAll("path")],
    }));
    this.overlay = root.querySelector(".run-axis");
  }

  setBins({ columns }) {
    this.edges = columns.get("edges").samples;
    for (const row of this.rows) {
      row.worst = columns.get(`worst.${row.column.slice(4)}`).samples;
      row.use = columns.get(row.column).values;
    }
  }

  rowOf(target) { return this.rows.find(r => r.element === target.closest(".run-plot")); }

  bin(sample) {
    let low = 0, high = this.edges.length - 2;
    while (low < high) {
      const middle = (low + high + 1) >> 1;
      if (this.edges[middle] <= sample) low = middle; else high = middle - 1;
    }
    return low;
  }

  // The sample a place on the map stands for: the worst of its bin, else the sample itself.
  worstAt(row, sample) {
    const k = Math.min(Math.max(Math.round(sample), 0), this.count - 1);
    const worst = row.worst?.[this.bin(k)] ?? -1;
    return worst >= 0 ? worst : k;
  }

  // From a sample to the worst one some bins on, passing bins in which the criterion does not apply.
  walk(row, sample, bins) {
    const direction = Math.sign(bins), last = this.edges.length - 2;
    let at = this.bin(sample);
    for (let left = Math.abs(bins); left > 0;) {
      at += direction;
      if (at < 0 || at > last) return direction < 0 ? 0 : this.count - 1;
      if (row.worst[at] >= 0) left--;
    }
    return row.worst[at];
  }

  describe(sample) {
    for (const row of this.rows) {
      row.element.setAttribute("aria-valuenow", sample);
      const use = row.use ? useText(row.use[this.bin(sample)]) : "";
      row.element.setAttribute("aria-valuetext", `${number(sample * this.period, 2)} seconds, worst here ${use}`);
    }
  }

  zoom(view) {
    const [from, to] = view;
    for (const row of this.rows) {
      row.svg.setAttribute("viewBox", `${from + 0.5} 0 ${to - from} ${height}`);
      const sign = row.element.querySelector(".run-worst");
      if (sign) {
        const share = (Number(sign.dataset.at) - from) / (to - from);
        sign.style.left = `${share * 100}%`;
        sign.hidden = share < 0 || share > 1;
      }
      // Whole run again: the stored bins.
      if (to - from >= this.count) this.#restore(row);
    }
  }

  // Rows from samples of the window, at the window's own resolution.
  refine({ about, columns }) {
    for (const row of this.rows) {
      const column = columns.get(row.column);
      if (!column || (about.from === 0 && about.to === this.count)) continue;
      const shapes = outlines(column.samples, column.values, about.to, row.near);
      row.svg.querySelectorAll("path").forEach(p => p.remove());
      for (const [look, d] of shapes) {
        const path = document.createElementNS("http://www.w3.org/2000/svg", "path");
        path.setAttribute("class", look);
        path.setAttribute("d", d);
        row.svg.append(path);
      }
      row.refined = true;
    }
  }

  marks(view, width, scene) {
    const [from, to] = view, spots = [];
    const left = sample => (sample - from) / (to - from) * 100;
    const add = (className, share, text, title) => {
      if (share < -0.01 || share > 100.01) return;
      const e = document.createElement("span");
      e.className = `${className}${share > 96 ? " end" : share < 3 ? " start" : ""}`;
      e.style.left = `${share}%`;
      e.textContent = text;
      if (title) e.title = title;
      spots.push(e);
    };
    const seconds = step((to - from) * this.period, width / 90);
    const decimals = Math.max(0, -Math.floor(Math.log10(seconds)));
    for (let t = Math.ceil(Math.max(from, 0) * this.period / seconds) * seconds; t / this.period <= Math.min(to, this.count - 1) + 1e-6; t += seconds)
      add("run-tick", left(t / this.period), `${number(t, decimals)} s`);
    if (scene) {
      this.#pathTicks(scene, view, width, (sample, text) => add("run-tick path", left(sample), text));
      let free = -Infinity;
      for (const { sample, waypoint, label } of scene.about.marks) {
        const x = left(sample) / 100 * width, text = label || `${waypoint + 1}`, roomy = x - free > 0;
        add(`run-mark${roomy ? "" : " bare"}`, left(sample), roomy ? text : "", `waypoint ${waypoint + 1}${label ? `, ${label}` : ""}, ${number(sample * this.period, 2)} s`);
        if (roomy) free = x + 14 + 6.2 * text.length;
      }
    }
    this.axis.replaceChildren(...spots);
  }

  #pathTicks(scene, [from, to], width, add) {
    const frames = scene.columns.get("frame").samples, path = scene.columns.get("path").values;
    const inside = i => frames[i] >= from && frames[i] <= to;
    const first = frames.findIndex((_, i) => inside(i)), last = frames.findLastIndex((_, i) => inside(i));
    if (first < 0 || !(path[last] > path[first])) return;
    const share = step(path[last] - path[first], width / 90), decimals = Math.max(0, -Math.floor(Math.log10(share) + 2));
    let next = Math.ceil(path[first] / share - 1e-6) * share;
    for (let i = first; i <= last; i++)
      if (path[i] >= next - 1e-6) {
        add(frames[i], `${number(next * 100, decimals)} %`);
        while (next <= path[i] + 1e-6) next += share;
      }
  }

  #restore(row) {
    if (!row.refined) return;
    row.svg.querySelectorAll("path").forEach(p => p.remove());
    row.svg.append(...row.drawn);
    row.refined = false;
  }
}

// One outline per step of the scale from thinned samples. Samples closer together than a stroke share one, as high as the highest of them.
export function outlines(samples, values, end, near, strokes = 700) {
  const shapes = new Map(), span = (end - samples[0]) / strokes;
  for (let i = 0; i < samples.length;) {
    const from = samples[i];
    let use = NaN;
    do {
      if (!(values[i] / 100 <= use) && !Number.isNaN(values[i])) use = values[i] / 100;
      i++;
    } while (i < samples.length && samples[i] - from < span);
    if (Number.isNaN(use)) continue;
    const look = useLook(use, near);
    const y = look === "use-over" ? Math.min(limitLine - 1, bar(use)) : Math.min(height - 2, Math.max(limitLine, bar(use)));
    shapes.set(look, `${shapes.get(look) ?? ""}M${from} ${height}V${y.toFixed(1)}H${samples[i] ?? end}V${height}z`);
  }
  return shapes;
}

const bar = use => height - Math.min(Math.max(use, 0), fullUse) / fullUse * height;
