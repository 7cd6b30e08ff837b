// A camera that turns about a target. Right-handed, z up; angles in radians.
export class Camera {
  azimuth = -0.9;
  elevation = 0.42;
  distance = 4;
  target = [0, 0, 0.5];
  #half = [1, 1];
  #focal = 1;

  resize(width, height) {
    this.#half = [width / 2, height / 2];
    this.#focal = 1.75 * Math.min(width, height);
    this.prepare();
  }

  prepare() {
    const ca = Math.cos(this.azimuth), sa = Math.sin(this.azimuth), ce = Math.cos(this.elevation), se = Math.sin(this.elevation);
    this.right = [-sa, ca, 0];
    this.up = [-se * ca, -se * sa, ce];
    this.back = [ce * ca, ce * sa, se];
    return this;
  }

  // [x, y, depth, pixels per metre]; depth grows away from the eye.
  project(p) {
    const x = p[0] - this.target[0], y = p[1] - this.target[1], z = p[2] - this.target[2];
    const r = this.right, u = this.up, b = this.back;
    const depth = Math.max(this.distance - (x * b[0] + y * b[1] + z * b[2]), 0.02);
    const scale = this.#focal / depth;
    return [this.#half[0] + scale * (x * r[0] + y * r[1] + z * r[2]), this.#half[1] - scale * (x * u[0] + y * u[1] + z * u[2]), depth, scale];
  }

  // Looks at a set of points so that all of them are inside the picture.
  fit(points, margin = 1.12) {
    const low = [Infinity, Infinity, Infinity], high = [-Infinity, -Infinity, -Infinity];
    for (const p of points)
      for (let i = 0; i < 3; i++) { low[i] = Math.min(low[i], p[i]); high[i] = Math.max(high[i], p[i]); }
    if (!Number.isFinite(low[0])) return;
    this.target = low.map((l, i) => (l + high[i]) / 2);
    this.prepare();
    let distance = 0.1;
    for (const p of points) {
      const d = p.map((v, i) => v - this.target[i]);
      const across = Math.abs(d[0] * this.right[0] + d[1] * this.right[1] + d[2] * this.right[2]) / this.#half[0];
      const along = Math.abs(d[0] * this.up[0] + d[1] * this.up[1] + d[2] * this.up[2]) / this.#half[1];
      const nearer = d[0] * this.back[0] + d[1] * this.back[1] + d[2] * this.back[2];
      distance = Math.max(distance, Math.max(across, along) * this.#focal * margin + nearer);
    }
    this.distance = distance;
    this.prepare();
  }

  turn(azimuth, elevation) {
    this.azimuth += azimuth;
    this.elevation = Math.min(1.55, Math.max(-1.2, this.elevation + elevation));
    this.prepare();
  }

  shift(dx, dy) {
    const k = this.distance / this.#focal;
    this.target = this.target.map((t, i) => t - k * dx * this.right[i] + k * dy * this.up[i]);
    this.prepare();
  }

  zoom(factor) {
    this.distance = Math.min(200, Math.max(0.05, this.distance * factor));
    this.prepare();
  }
}
