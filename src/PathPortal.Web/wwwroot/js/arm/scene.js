// Draws an arm and a path on a plain canvas: no graphics processor is needed, and a new posture costs a few milliseconds.
import { add, axis, origin, posture, reach, transform } from "./kinematics.js";
import { Camera } from "./camera.js";
import { armBodies } from "./solids.js";
import { tokenColour, onThemeChange } from "../tokens.js";

const names = {
  edge: "--scene-edge", link: "--scene-link", linkLight: "--scene-link-light", linkDark: "--scene-link-dark", joint: "--scene-joint", cap: "--scene-cap",
  marked: "--use-over", rail: "--line-strong", railLight: "--line-strong", railDark: "--line-strong", tool: "--accent", toolLight: "--accent", toolDark: "--accent-strong",
  floor: "--line-soft", shadow: "--scene-shadow", programmed: "--ink-2", ink: "--ink", ink2: "--ink-2", halo: "--surface", cursor: "--focus",
  "use-0": "--scene-use-0", "use-1": "--scene-use-1", "use-2": "--scene-use-2", "use-3": "--scene-use-3", "use-near": "--use-near", "use-over": "--use-over", "use-none": "--scene-use-none",
};

export class ArmCanvas {
  constructor(host, drawing) {
    this.canvas = host.querySelector("canvas");
    this.drawing = drawing;
    this.camera = new Camera();
    this.size = reach(drawing);
    this.joints = drawing.joints.map(j => j.low != null && j.high != null ? Math.min(Math.max(0, j.low), j.high) : 0);
    this.path = null;
    this.marked = -1;
    this.#colour();
    this.#observe(host);
  }

  // tool, reference: points in the work frame; looks: one use step per point.
  setPath(tool, reference, looks) {
    const work = this.drawing.work ?? [1, 0, 0, 0, 1, 0, 0, 0, 1, 0, 0, 0];
    this.path = { tool: tool.map(p => transform(work, p)), reference: reference.map(p => transform(work, p)), looks };
    this.draw();
  }

  setPosture(joints, marked = -1) {
    this.joints = joints;
    this.marked = marked;
    this.draw();
  }

  view(name) {
    const now = posture(this.drawing, this.joints);
    const arm = [origin(this.drawing.base), ...now.frames.flatMap(f => [origin(f.fixed), origin(f.moved)]), origin(now.flange), origin(now.tool)];
    const path = this.path ? [...this.path.tool, ...this.path.reference] : [];
    if (name === "path" && path.length) this.camera.fit(path, 1.3);
    else if (name === "tool") {
      this.camera.target = origin(now.tool);
      this.camera.distance = this.size * 0.55;
      this.camera.prepare();
    } else this.camera.fit([...arm, ...path]);
    this.draw();
  }

  draw() { this.wanted ??= requestAnimationFrame(() => { this.wanted = null; this.#paint(); }); }

  stop() {
    this.resizing.disconnect();
    this.forget();
    if (this.wanted) cancelAnimationFrame(this.wanted);
  }

  #colour() { this.colours = Object.fromEntries(Object.entries(names).map(([key, name]) => [key, tokenColour(name)])); }

  #observe(host) {
    this.forget = onThemeChange(() => { this.#colour(); this.draw(); });
    this.resizing = new ResizeObserver(() => this.#resize());
    this.resizing.observe(this.canvas);
    this.#resize();
    this.view("cell");
    const c = this.canvas, camera = this.camera;
    const fingers = new Map();
    c.addEventListener("pointerdown", e => { fingers.set(e.pointerId, [e.clientX, e.clientY]); c.setPointerCapture(e.pointerId); });
    for (const end of ["pointerup", "pointercancel"]) c.addEventListener(end, e => fingers.delete(e.pointerId));
    c.addEventListener("pointermove", e => {
      const last = fingers.get(e.pointerId);
      if (!last) return;
      const dx = e.clientX - last[0], dy = e.clientY - last[1];
      if (fingers.size === 2) {
        const other = [...fingers].find(([id]) => id !== e.pointerId)[1];
        camera.zoom(Math.hypot(last[0] - other[0], last[1] - other[1]) / Math.max(Math.hypot(e.clientX - other[0], e.clientY - other[1]), 1));
      } else if (e.shiftKey || e.buttons === 2) camera.shift(dx, dy);
      else camera.turn(-dx * 0.008, dy * 0.008);
      fingers.set(e.pointerId, [e.clientX, e.clientY]);
      this.draw();
    });
    c.addEventListener("wheel", e => {
      // A bare wheel scrolls the page; over a focused or held picture it comes nearer.
      if (!e.ctrlKey && document.activeElement !== c) return;
      e.preventDefault();
      camera.zoom(Math.exp(e.deltaY * 0.0012));
      this.draw();
    }, { passive: false });
    const keys = {
      ArrowLeft: () => camera.turn(-0.12, 0), ArrowRight: () => camera.turn(0.12, 0), ArrowUp: () => camera.turn(0, 0.1), ArrowDown: () => camera.turn(0, -0.1),
      "+": () => camera.zoom(0.85), "=": () => camera.zoom(0.85), "-": () => camera.zoom(1.18), 0: () => this.view("cell"),
    };
    c.addEventListener("keydown", e => {
      if (!keys[e.key] || e.ctrlKey || e.metaKey || e.altKey) return;
      e.preventDefault();
      keys[e.key]();
      this.draw();
    });
    host.addEventListener("click", e => {
      const name = e.target.closest("[data-view]")?.dataset.view;
      if (name === "nearer" || name === "farther") { camera.zoom(name === "nearer" ? 0.75 : 1.33); this.draw(); }
      else if (name) this.view(name);
    });
  }

  #resize() {
    const { clientWidth: w, clientHeight: h } = this.canvas, ratio = window.devicePixelRatio || 1;
    if (!w || !h) return;
    this.canvas.width = Math.round(w * ratio);
    this.canvas.height = Math.round(h * ratio);
    this.camera.resize(w, h);
    this.draw();
  }

  #paint() {
    const ctx = this.canvas.getContext("2d"), ratio = window.devicePixelRatio || 1;
    const now = posture(this.drawing, this.joints);
    ctx.setTransform(ratio, 0, 0, ratio, 0, 0);
    ctx.clearRect(0, 0, this.canvas.width, this.canvas.height);
    ctx.lineJoin = ctx.lineCap = "round";
    this.#floor(ctx, now);
    this.#line(ctx, this.path?.reference, this.colours.programmed, 1, [3, 3]);
    const bodies = armBodies(this.drawing, now, this.size, this.marked);
    bodies.map(b => [this.camera.project(b.centre)[2], b]).sort((a, b) => b[0] - a[0]).forEach(([, b]) => b.draw(ctx, this.camera, this.colours));
    this.#usePath(ctx);
    this.#frame(ctx, this.drawing.base, "base", 0.16);
    if (this.drawing.work) this.#frame(ctx, this.drawing.work, "work", 0.12);
    this.#frame(ctx, now.tool, "tool", 0.09);
    const tip = this.camera.project(origin(now.tool));
    ctx.beginPath();
    ctx.arc(tip[0], tip[1], 4.5, 0, 7);
    ctx.fillStyle = this.colours.cursor;
    ctx.strokeStyle = this.colours.halo;
    ctx.lineWidth = 2;
    ctx.fill();
    ctx.stroke();
  }

  #floor(ctx, now) {
    const base = origin(this.drawing.base), step = this.size > 1.2 ? 0.5 : 0.25, n = Math.ceil(this.size * 1.3 / step);
    const z = Math.min(0, base[2]), x0 = Math.round(base[0] / step) * step, y0 = Math.round(base[1] / step) * step;
    for (let i = -n; i <= n; i++) {
      this.#line(ctx, [[x0 + i * step, y0 - n * step, z], [x0 + i * step, y0 + n * step, z]], this.colours.floor, 1);
      this.#line(ctx, [[x0 - n * step, y0 + i * step, z], [x0 + n * step, y0 + i * step, z]], this.colours.floor, 1);
    }
    const shadow = [origin(this.drawing.base), ...now.frames.map(f => origin(f.fixed)), origin(now.flange), origin(now.tool)].map(p => [p[0], p[1], z]);
    this.#line(ctx, shadow, this.colours.shadow, this.size * 0.05 * this.camera.project(shadow[0])[3]);
  }

  #line(ctx, points, colour, width, dash = []) {
    if (!points?.length) return;
    ctx.beginPath();
    points.forEach((p, i) => { const [x, y] = this.camera.project(p); i ? ctx.lineTo(x, y) : ctx.moveTo(x, y); });
    ctx.strokeStyle = colour;
    ctx.lineWidth = width;
    ctx.setLineDash(dash);
    ctx.stroke();
    ctx.setLineDash([]);
  }

  #usePath(ctx) {
    if (!this.path) return;
    const { tool, looks } = this.path;
    this.#line(ctx, tool, this.colours.halo, 5);
    const widths = { "use-near": 4, "use-over": 6 };
    for (const wanted of [false, true])
      for (let i = 0; i + 1 < tool.length;) {
        const look = looks[i], from = i;
        while (i + 1 < tool.length && looks[i] === look) i++;
        if ((look === "use-over" || look === "use-near") === wanted) this.#line(ctx, tool.slice(from, i + 1), this.colours[look], widths[look] ?? 2.5);
      }
  }

  #frame(ctx, pose, label, share) {
    const at = origin(pose), o = this.camera.project(at);
    ctx.font = "600 10.5px system-ui, sans-serif";
    ctx.textAlign = "center";
    ctx.textBaseline = "middle";
    ["x", "y", "z"].forEach((name, i) => {
      const end = add(at, axis(pose, i), this.size * share);
      this.#line(ctx, [at, end], this.colours.ink, i === 2 ? 2 : 1.25);
      const [x, y] = this.camera.project(add(at, axis(pose, i), this.size * share * 1.15));
      this.#text(ctx, name, x, y, this.colours.ink);
    });
    this.#text(ctx, label, o[0], o[1] + 13, this.colours.ink2);
  }

  #text(ctx, text, x, y, colour) {
    ctx.strokeStyle = this.colours.halo;
    ctx.lineWidth = 3;
    ctx.strokeText(text, x, y);
    ctx.fillStyle = colour;
    ctx.fillText(text, x, y);
  }
}

