// Charts draw on a canvas and need colours as values; this resolves the names of tokens.css for the theme in force.
export function tokenColour(name) {
  const probe = document.createElement("span");
  probe.style.color = `var(${name})`;
  probe.hidden = true;
  document.body.append(probe);
  const colour = getComputedStyle(probe).color;
  probe.remove();
  return colour;
}

// Limit use 0..1.5 (1 is the limit) as a stepped colour scale: same steps as the badges, with the jump at exactly 100 %.
export function limitUseScale(near = 0.8) {
  const stops = [[0, "--use-0"], [near * 0.25, "--use-1"], [near * 0.5, "--use-2"], [near * 0.75, "--use-3"], [near, "--use-near"], [1, "--use-over"]];
  const end = 1.5;
  const scale = [];
  stops.forEach(([from, name], i) => {
    const to = i + 1 < stops.length ? stops[i + 1][0] : end;
    const colour = tokenColour(name);
    scale.push([from / end, colour], [to / end, colour]);
  });
  return { scale, min: 0, max: end, none: tokenColour("--use-none") };
}

// Calls back when the reader or the system changes between light and dark.
export function onThemeChange(callback) {
  const media = matchMedia("(prefers-color-scheme: dark)");
  media.addEventListener("change", callback);
  return () => media.removeEventListener("change", callback);
}
