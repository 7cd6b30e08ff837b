// An arm at a posture, for pages that show no run. data-drawing holds the arm, data-value the joint values (rad or m).
import { ArmCanvas } from "./scene.js";

export function start(element) {
  const scene = new ArmCanvas(element, JSON.parse(element.dataset.drawing));
  const pose = text => { if (text) { scene.setPosture(JSON.parse(text)); } };
  pose(element.dataset.value);
  scene.view("cell");
  return { stop: () => scene.stop(), update: pose };
}
