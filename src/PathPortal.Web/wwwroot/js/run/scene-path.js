// Puts a run's path and postures into the picture.
import { useLook } from "./format.js";

export class ScenePath {
  constructor(scene, { about, columns }, rows, count) {
    this.scene = scene;
    this.rows = rows;
    this.columns = columns;
    this.count = count;
    this.frames = columns.get("frame").samples;
    this.joints = about.drawing.joints.map((_, j) => columns.get(`q${j}`).values);
    this.slides = about.drawing.joints.map(j => j.slides);
    const points = name => Array.from(this.frames, (_, i) => ["x", "y", "z"].map(a => columns.get(`${name}.${a}`).values[i]));
    this.tool = points("tool");
    this.reference = points("reference");
  }

  // By one criterion, or by the worst of them at each place.
  colour(column) {
    const rows = column ? this.rows.filter(r => r.column === column) : this.rows;
    const order = ["use-none", "use-0", "use-1", "use-2", "use-3", "use-near", "use-over"];
    const looks = Array.from(this.frames, (_, i) => rows.reduce((worst, row) => {
      const look = useLook(this.columns.get(row.column)?.values[i], row.near);
      return order.indexOf(look) > order.indexOf(worst) ? look : worst;
    }, "use-none"));
    this.scene.setPath(this.tool, this.reference, looks);
  }

  // Exact where the samples are here, else between the two nearest frames.
  pose(sample, at = null, marked = -1) {
    const joints = at
      ? this.slides.map((slides, j) => slides ? at(`q${j}`) / 1e3 : at(`q${j}`) * Math.PI / 180)
      : this.#between(sample);
    this.scene.setPosture(joints, marked);
  }

  #between(sample) {
    const last = this.frames.length - 1;
    const f = this.count > 1 ? sample / (this.count - 1) * last : 0, i = Math.min(Math.floor(f), Math.max(last - 1, 0)), j = Math.min(i + 1, last);
    return this.joints.map(q => q[i] + (q[j] - q[i]) * (f - i));
  }
}
