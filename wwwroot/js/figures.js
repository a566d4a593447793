// What a live chart cannot learn on the server: the page's colours, and when the chart has been drawn.

const dark = window.matchMedia("(prefers-color-scheme: dark)");

/** The colours of the page as its style sheet gives them. */
export function ink() {
  const style = getComputedStyle(document.documentElement);
  const colour = name => style.getPropertyValue(name).trim();
  return {
    isDark: dark.matches,
    paper: colour("--paper"),
    ink: colour("--ink"),
    second: colour("--second"),
    markLow: colour("--mark-low"),
    markHigh: colour("--mark-high"),
  };
}

/** Calls back whenever the page turns dark or light; returns what stops it. */
export function watchInk(page) {
  const turned = () => page.invokeMethodAsync("InkTurnedAsync");
  dark.addEventListener("change", turned);
  return { stop: () => dark.removeEventListener("change", turned) };
}

/** Resolves once the chart in an element has painted its cells; false when it has not within ten seconds. */
export async function drawn(element) {
  for (let waited = 0; waited < 10000; waited += 25) {
    if (!element.isConnected) return false;
    if (element.querySelector(".heatmaplayer image")) return true;
    await new Promise(later => setTimeout(later, 25));
  }
  return false;
}

/** Puts a text on the clipboard. */
export async function copy(text) {
  await navigator.clipboard.writeText(text);
}
