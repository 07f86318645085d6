// What Chromium has and jsdom lacks, as far as the pages use it.
if (HTMLDialogElement.prototype.showModal === undefined) {
  HTMLDialogElement.prototype.showModal = function showModal() {
    this.open = true;
    this.querySelector('[autofocus], input, button')?.focus();
  };
  HTMLDialogElement.prototype.close = function close() {
    this.open = false;
  };
}
window.scrollTo = () => {};
window.matchMedia ??= (media) => ({ matches: false, media, addEventListener() {}, removeEventListener() {} });
window.CSS ??= {};
window.CSS.escape ??= (text) => text.replace(/[^\w-]/g, (character) => `\\${character}`);
