// What the page waited for is there.
export function start() {
  location.reload();
}
