// The values at the cursor, in every element that names a column.
import { number, useLook, useText } from "./format.js";

export class Moment {
  constructor(root, period) {
    this.period = period;
    this.part = name => root.querySelector(`[data-part="${name}"]`);
    this.panel = this.part("moment");
    this.values = [...root.querySelectorAll("[data-column][data-decimals]")].map(e => ({ element: e, column: e.dataset.column, decimals: Number(e.dataset.decimals) }));
    this.uses = [...root.querySelectorAll(".run-use")].map(e => ({
      element: e, column: e.dataset.column, near: Number(e.dataset.near), name: e.dataset.name, binding: e.dataset.binding === "yes",
      fill: e.querySelector(".fill"), text: e.querySelector("[data-part=use]"),
    }));
    this.joints = [...root.querySelectorAll("tr[data-joint]")].map(e => ({ element: e, joint: Number(e.dataset.joint), name: e.dataset.name }));
  }

  // What is known without the samples.
  place(sample, mark) {
    this.part("time").textContent = `${number(sample * this.period, 3)} s`;
    const slider = this.part("scrub");
    slider.value = sample;
    slider.setAttribute("aria-valuetext", `${number(sample * this.period, 3)} seconds`);
    this.mark = mark;
  }

  wait() { this.panel.classList.add("waiting"); }

  // Fills in everything and returns the worst: { name, use, joint, marked }.
  fill(at) {
    this.panel.classList.remove("waiting");
    for (const { element, column, decimals } of this.values) element.textContent = number(at(column), decimals);
    let worst = null;
    for (const use of this.uses) {
      const share = at(use.column) / 100;
      const look = useLook(share, use.near);
      use.text.textContent = useText(share);
      use.fill.className = `fill ${look}`;
      use.fill.style.width = `${Math.min(Math.max(share || 0, 0), 1.5) / 1.5 * 100}%`;
      use.element.classList.toggle("over", look === "use-over");
      if (!Number.isNaN(share) && (!worst || this.#before(use, share, worst))) worst = { use, share, look };
    }
    const joint = this.#joint(worst, at);
    for (const row of this.joints) row.element.classList.toggle("worst", row.joint === joint?.joint);
    this.part("worst").textContent = worst
      ? `Closest to its limit here: ${worst.use.name}${joint ? `, ${joint.name}` : ""}, ${useText(worst.share)}${worst.use.binding ? "" : " (advisory)"}.`
      : "No criterion applies at this moment.";
    this.part("worst").className = `run-cause ${worst?.look ?? ""}`;
    const process = at("process") > 0.5 ? "process on" : "process off";
    this.part("where").textContent = `${number(at("path"), 1)} % of the path, ${this.mark ?? `towards waypoint ${at("waypoint") + 1}`}, ${process}`;
    return { joint: worst?.look === "use-over" && joint ? joint.joint : -1 };
  }

  // Binding criteria over their limit come before advice, whatever the figures.
  #before(use, share, worst) {
    const over = u => u.binding && u.share > 1;
    const a = over({ binding: use.binding, share }), b = over({ binding: worst.use.binding, share: worst.share });
    return a === b ? share > worst.share : a;
  }

  #joint(worst, at) {
    const columns = { "use.JointSpeed": ["s", 1], "use.JointAcceleration": ["b", 1], "use.JointPosition": ["m", -1] }[worst?.use.column];
    if (!columns) return null;
    const [column, sign] = columns;
    return this.joints.filter(j => !Number.isNaN(at(`${column}${j.joint}`)))
      .sort((a, b) => sign * (at(`${column}${b.joint}`) - at(`${column}${a.joint}`)))[0] ?? null;
  }
}
