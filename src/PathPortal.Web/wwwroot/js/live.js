// Regions marked data-live are fetched again every second while the server says that something in them is under way.
const everyMs = 1000;
const slowerMs = 4000;
const followed = new WeakSet();

async function refresh(region) {
  const response = await fetch(region.dataset.live, { headers: { "X-Fragment": "yes" }, redirect: "error" });
  if (!response.ok) throw new Error(String(response.status));
  // Somebody reading inside it keeps their place; the next round comes soon.
  if (region.contains(document.activeElement) && document.activeElement !== region) return true;
  region.innerHTML = await response.text();
  return response.headers.get("X-Under-Way") === "yes";
}

async function follow(region) {
  let wait = everyMs;
  let failures = 0;
  while (region.isConnected && region.dataset.liveActive === "yes") {
    await new Promise(done => setTimeout(done, document.hidden ? slowerMs : wait));
    try {
      if (!await refresh(region)) region.dataset.liveActive = "no";
      failures = 0;
      wait = everyMs;
    } catch {
      wait = slowerMs;
      if (++failures === 3) region.insertAdjacentHTML("beforeend", '<p class="note warn" role="status">The portal does not answer; these figures may be old. Trying again.</p>');
    }
  }
  followed.delete(region);
}

function start() {
  for (const region of document.querySelectorAll('[data-live][data-live-active="yes"]')) {
    if (followed.has(region)) continue;
    followed.add(region);
    follow(region);
  }
}

start();
document.addEventListener("DOMContentLoaded", () => globalThis.Blazor?.addEventListener?.("enhancedload", start));
