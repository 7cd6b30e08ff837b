// The arm as simple bodies: rods for links, drums for joints. Each has a depth, so that a painter can draw far ones first.
import { add, axis, dot, length, origin, subtract } from "./kinematics.js";

const corners = 20;

function ring(centre, x, y, radius) {
  return Array.from({ length: corners }, (_, i) => {
    const a = 2 * Math.PI * i / corners;
    return add(add(centre, x, radius * Math.cos(a)), y, radius * Math.sin(a));
  });
}

function hull(points) {
  const p = [...points].sort((a, b) => a[0] - b[0] || a[1] - b[1]);
  const half = ordered => {
    const line = [];
    for (const q of ordered) {
      while (line.length > 1) {
        const [a, b] = line.slice(-2);
        if ((b[0] - a[0]) * (q[1] - a[1]) - (b[1] - a[1]) * (q[0] - a[0]) > 0) break;
        line.pop();
      }
      line.push(q);
    }
    line.pop();
    return line;
  };
  return half(p).concat(half(p.reverse()));
}

function outline(ctx, points) {
  ctx.beginPath();
  points.forEach((p, i) => i ? ctx.lineTo(p[0], p[1]) : ctx.moveTo(p[0], p[1]));
  ctx.closePath();
}

// A short cylinder about a joint's axis.
function drum(pose, radius, half, look) {
  const z = axis(pose, 2), centre = origin(pose);
  return {
    centre,
    draw(ctx, camera, colours) {
      const near = dot(z, camera.back) >= 0 ? 1 : -1;
      const front = ring(add(centre, z, near * half), axis(pose, 0), axis(pose, 1), radius).map(p => camera.project(p));
      const rear = ring(add(centre, z, -near * half), axis(pose, 0), axis(pose, 1), radius).map(p => camera.project(p));
      ctx.lineWidth = 1;
      ctx.strokeStyle = colours.edge;
      ctx.fillStyle = colours[look];
      outline(ctx, hull([...front, ...rear]));
      ctx.fill();
      ctx.stroke();
      ctx.fillStyle = colours.cap;
      outline(ctx, front);
      ctx.fill();
      ctx.stroke();
    },
  };
}

// A rod between two points, thicker at one end.
function rod(from, to, start, end, look = "link") {
  return {
    centre: add(from, subtract(to, from), 0.5),
    draw(ctx, camera, colours) {
      const a = camera.project(from), b = camera.project(to);
      const ra = start * a[3], rb = end * b[3];
      const dx = b[0] - a[0], dy = b[1] - a[1], l = Math.hypot(dx, dy) || 1;
      const nx = -dy / l, ny = dx / l;
      const body = () => {
        const angle = Math.atan2(ny, nx);
        ctx.beginPath();
        ctx.arc(a[0], a[1], ra, angle, angle + Math.PI);
        ctx.arc(b[0], b[1], rb, angle + Math.PI, angle + 2 * Math.PI);
        ctx.closePath();
      };
      const shade = ctx.createLinearGradient(a[0] - nx * ra, a[1] - ny * ra, a[0] + nx * ra, a[1] + ny * ra);
      const lit = nx * -0.5 + ny * -0.85 > 0;
      shade.addColorStop(0, colours[look + (lit ? "Dark" : "Light")]);
      shade.addColorStop(0.5, colours[look]);
      shade.addColorStop(1, colours[look + (lit ? "Light" : "Dark")]);
      body();
      ctx.fillStyle = shade;
      ctx.fill();
      ctx.lineWidth = 1;
      ctx.strokeStyle = colours.edge;
      ctx.stroke();
    },
  };
}

// A link goes along the axis it turns about first, then across to the next axis, as links do.
function link(pose, to, radius, bodies) {
  const from = origin(pose), z = axis(pose, 2);
  const bend = add(from, z, dot(subtract(to, from), z));
  const pieces = [[from, bend], [bend, to]].filter(([a, b]) => length(subtract(b, a)) > radius * 0.4);
  for (const [a, b] of pieces) bodies.push(rod(a, b, radius, radius * 0.94));
}

// The bodies of an arm in one posture; marked joints are drawn in the colour of what is over its limit.
export function armBodies(drawing, posture, size, marked = -1) {
  const bodies = [];
  const count = drawing.joints.length;
  const radius = j => size * (0.052 - 0.03 * Math.min(j / Math.max(count - 1, 1), 1));
  let pose = drawing.base;
  const foot = origin(drawing.base);
  if (foot[2] > size * 0.03) bodies.push(rod([foot[0], foot[1], 0], foot, size * 0.07, size * 0.055, "rail"));
  drawing.joints.forEach((joint, j) => {
    const { fixed, moved } = posture.frames[j];
    link(pose, origin(fixed), radius(j) * 0.82, bodies);
    const look = j === marked ? "marked" : "joint";
    if (joint.slides) {
      const rail = value => add(origin(fixed), axis(fixed, 2), joint.sign * value + joint.zero);
      if (joint.low != null && joint.high != null) bodies.push(rod(rail(joint.low), rail(joint.high), size * 0.018, size * 0.018, "rail"));
      bodies.push(drum(moved, radius(j) * 1.1, radius(j) * 1.1, look));
    } else {
      bodies.push(drum(fixed, radius(j) * 1.12, radius(j) * 1.25, look));
    }
    pose = moved;
  });
  link(pose, origin(posture.flange), radius(count) * 0.82, bodies);
  if (drawing.tool) bodies.push(rod(origin(posture.flange), origin(posture.tool), size * 0.013, size * 0.004, "tool"));
  return bodies;
}
