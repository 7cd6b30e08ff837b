// Poses as arrays of twelve numbers: a rotation by rows, then a translation in metres. For drawing only; results come from the server.
export const identity = [1, 0, 0, 0, 1, 0, 0, 0, 1, 0, 0, 0];

export function multiply(a, b) {
  const c = new Array(12);
  for (let i = 0; i < 3; i++) {
    for (let j = 0; j < 3; j++) c[3 * i + j] = a[3 * i] * b[j] + a[3 * i + 1] * b[3 + j] + a[3 * i + 2] * b[6 + j];
    c[9 + i] = a[3 * i] * b[9] + a[3 * i + 1] * b[10] + a[3 * i + 2] * b[11] + a[9 + i];
  }
  return c;
}

export const transform = (x, p) => [
  x[0] * p[0] + x[1] * p[1] + x[2] * p[2] + x[9],
  x[3] * p[0] + x[4] * p[1] + x[5] * p[2] + x[10],
  x[6] * p[0] + x[7] * p[1] + x[8] * p[2] + x[11],
];

export const origin = x => [x[9], x[10], x[11]];
export const axis = (x, i) => [x[i], x[3 + i], x[6 + i]];
export const add = (a, b, k = 1) => [a[0] + k * b[0], a[1] + k * b[1], a[2] + k * b[2]];
export const subtract = (a, b) => [a[0] - b[0], a[1] - b[1], a[2] - b[2]];
export const dot = (a, b) => a[0] * b[0] + a[1] * b[1] + a[2] * b[2];
export const length = a => Math.hypot(a[0], a[1], a[2]);

function motion(joint, value) {
  const m = joint.sign * value + joint.zero;
  if (joint.slides) return [1, 0, 0, 0, 1, 0, 0, 0, 1, 0, 0, m];
  const c = Math.cos(m), s = Math.sin(m);
  return [c, -s, 0, s, c, 0, 0, 0, 1, 0, 0, 0];
}

// Every frame of the chain in the cell: where each joint's axis stands, the frame it moves, the flange, the tool.
export function posture(drawing, joints) {
  let moved = drawing.base;
  const frames = drawing.joints.map((joint, j) => {
    const fixed = multiply(moved, joint.pose);
    moved = multiply(fixed, motion(joint, joints[j] ?? 0));
    return { fixed, moved };
  });
  const flange = multiply(moved, drawing.flange);
  return { frames, flange, tool: drawing.tool ? multiply(flange, drawing.tool) : flange };
}

// Length of the chain stretched out, to size what is drawn.
export function reach(drawing) {
  const links = drawing.joints.slice(1).map(j => length(j.pose.slice(9))).concat(length(drawing.flange.slice(9)));
  return Math.max(links.reduce((sum, l) => sum + l, 0), 0.05);
}
