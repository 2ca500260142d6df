// The script of the package, as text: it is shipped inside the page and never runs in this process.
// Plain JavaScript, kept to what follows a link cannot do; the page works without it.

export const CLIENT: string = `"use strict";
(() => {
  const panel = document.getElementById("trace");
  if (!panel) return;
  const matter = panel.querySelector(".trace-matter");
  const close = panel.querySelector("button");
  /** @type {HTMLElement | null} */
  let cameFrom = null;

  const targetOf = (/** @type {Element | null} */ link) => {
    const href = link ? link.getAttribute("href") : null;
    return href && href.startsWith("#") ? document.getElementById(href.slice(1)) : null;
  };

  const unmark = () => {
    for (const name of ["is-here", "is-ground", "is-user"]) {
      for (const marked of document.querySelectorAll("." + name)) marked.classList.remove(name);
    }
  };

  const mark = (/** @type {Element} */ row, /** @type {string} */ links, /** @type {string} */ name) => {
    for (const link of row.querySelectorAll(links)) {
      const line = targetOf(link);
      if (line) line.classList.add(name);
    }
    // A run of lines is written by its ends and carries the anchors of all.
    for (const run of row.querySelectorAll(links.replace("a.ref", "[data-lines]"))) {
      for (const anchor of (run.getAttribute("data-lines") || "").split(" ")) {
        const line = document.getElementById(anchor);
        if (line) line.classList.add(name);
      }
    }
  };

  const show = (/** @type {HTMLElement} */ link) => {
    const row = targetOf(link);
    if (!row || !matter) return false;
    unmark();
    mark(row, ".on a.ref", "is-ground");
    mark(row, ".by a.ref", "is-user");
    mark(row, "a.no", "is-here");
    link.classList.add("is-here");
    const copy = Array.from(row.childNodes, (node) => node.cloneNode(true));
    matter.replaceChildren(...copy);
    cameFrom = link;
    panel.hidden = false;
    panel.focus({ preventScroll: true });
    return true;
  };

  const hide = () => {
    if (panel.hidden) return;
    panel.hidden = true;
    unmark();
    if (cameFrom) cameFrom.focus({ preventScroll: true });
    cameFrom = null;
  };

  document.addEventListener("click", (event) => {
    if (event.ctrlKey || event.metaKey || event.shiftKey || event.altKey) return;
    const link = event.target instanceof Element ? event.target.closest("a.num") : null;
    if (link instanceof HTMLElement && show(link)) event.preventDefault();
  });
  document.addEventListener("keydown", (event) => {
    if (event.key === "Escape") hide();
  });
  if (close) close.addEventListener("click", hide);
})();
`;
