// Numbers as the rest of the portal writes them.
export function number(value, decimals) {
  if (value === undefined || Number.isNaN(value)) return "–";
  if (!Number.isFinite(value)) return value > 0 ? "∞" : "−∞";
  const text = Math.abs(value).toFixed(decimals).replace(/\B(?=(\d{3})+(?!\d)(?<!\.\d*))/g, "\u202f");
  return value < 0 && Number(value.toFixed(decimals)) !== 0 ? `−${text}` : text;
}

const passCeiling = 1 + 1e-7; // a float32 cannot tell closer

// The step of the use scale, as the badges name it; use 1 is the limit.
export function useLook(use, near) {
  if (use === undefined || Number.isNaN(use)) return "use-none";
  if (!(use <= passCeiling)) return "use-over";
  if (use >= near) return "use-near";
  return `use-${Math.min(3, Math.max(0, Math.floor(use / near * 4)))}`;
}

export function useText(use) {
  if (use === undefined || Number.isNaN(use)) return "–";
  if (!(use <= 9.99)) return ">999 %";
  const whole = Math.round(use * 100);
  if (!(use <= passCeiling)) return whole > 100 ? `${whole} %` : ">100 %";
  return use < 0.9995 && whole >= 100 ? ">99 %" : `${Math.min(whole, 100)} %`;
}

// A round step that gives about this many ticks.
export function step(span, ticks) {
  const raw = span / Math.max(ticks, 1), power = 10 ** Math.floor(Math.log10(raw));
  return power * [1, 2, 5, 10].find(m => m * power >= raw);
}
