// The link "Skip to the content" moves the focus too: in-page navigation is taken over by the circuit, which only scrolls.
document.addEventListener("click", (event) => {
  if (event.target.closest?.("a.skip")) {
    setTimeout(() => document.getElementById("content")?.focus(), 0);
  }
});
