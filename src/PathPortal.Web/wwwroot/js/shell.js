import "./page-module.js";

// Menus close on Escape and on a click elsewhere; without this script they still open and close.
document.addEventListener("keydown", event => {
  if (event.key !== "Escape") return;
  for (const menu of document.querySelectorAll("details.menu[open]")) {
    menu.open = false;
    menu.querySelector("summary")?.focus();
  }
});

document.addEventListener("click", event => {
  for (const menu of document.querySelectorAll("details.menu[open]"))
    if (!menu.contains(event.target)) menu.open = false;
});

// A form that asks for one more look before it is sent, or that must not be sent twice.
document.addEventListener("submit", event => {
  const form = event.target;
  if (!(form instanceof HTMLFormElement) || !form.hasAttribute("data-once")) return;
  if (form.dataset.sent === "yes") { event.preventDefault(); return; }
  form.dataset.sent = "yes";
  for (const button of form.querySelectorAll("button[type=submit]")) button.setAttribute("aria-disabled", "true");
});

// Coming back by the browser's Back button may restore the page as it was left.
addEventListener("pageshow", () => {
  for (const form of document.querySelectorAll("form[data-once]")) {
    delete form.dataset.sent;
    for (const button of form.querySelectorAll("button[type=submit]")) button.removeAttribute("aria-disabled");
  }
});

// Files too large for the portal are refused before they are sent; the server refuses them too.
document.addEventListener("change", event => {
  const input = event.target;
  if (!(input instanceof HTMLInputElement) || input.type !== "file" || !input.dataset.maxBytes) return;
  const file = input.files[0];
  const limit = Number(input.dataset.maxBytes);
  const message = file && file.size > limit
    ? `This file has ${(file.size / 1048576).toFixed(1)} MiB; the portal takes ${(limit / 1048576).toFixed(0)} MiB at most.` : "";
  input.setCustomValidity(message);
  if (message) input.reportValidity();
});
