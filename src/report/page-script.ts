/**
 * What makes the page livelier where scripts run; it reads as well without. No code is made from strings, nothing is fetched.
 *
 *   hover         words of a mark beside the pointer, in place of the browser's own tooltip
 *   pick          one limit state picked, in every chart and table at once
 *   sort          tables by any of their columns
 */
export const pageScript = `"use strict";
(() => {
  const all = (query, from = document) => [...from.querySelectorAll(query)];
  const make = (name, words = "", attributes = {}) => {
    const made = document.createElement(name);
    made.textContent = words;
    for (const [key, value] of Object.entries(attributes)) made.setAttribute(key, value);
    return made;
  };

  const tip = make("div", "", { id: "tip", role: "status", hidden: "" });
  document.body.append(tip);
  for (const title of all("svg title")) {
    const mark = title.parentElement;
    if (mark.localName === "svg") continue;
    mark.dataset.tip = title.textContent;
    title.remove();
  }
  const place = (event) => {
    const room = document.documentElement.clientWidth - tip.offsetWidth - 8;
    tip.style.left = Math.max(4, Math.min(event.clientX + 14, room)) + "px";
    const below = event.clientY + 20 + tip.offsetHeight < innerHeight;
    tip.style.top = (below ? event.clientY + 18 : event.clientY - tip.offsetHeight - 12) + "px";
  };
  document.addEventListener("pointerover", (event) => {
    const mark = event.target instanceof Element ? event.target.closest("[data-tip]") : null;
    tip.hidden = mark === null;
    if (mark === null) return;
    tip.textContent = mark.dataset.tip;
    place(event);
  });
  document.addEventListener("pointermove", (event) => { if (!tip.hidden) place(event); });

  const rows = all(".states li");
  const picker = make("div", "", { class: "picker", role: "group", "aria-label": "Show one limit state" });
  const pick = (state) => {
    for (const button of all("button", picker)) button.setAttribute("aria-pressed", String(button.value === state));
    for (const part of all("[data-state]")) {
      const other = state !== "" && part.dataset.state !== state && part.dataset.state !== "any";
      part.classList.toggle("dim", other);
    }
  };
  if (rows.length > 1) {
    picker.append("Show");
    const choices = [["", "all"], ...rows.map((row) => [row.dataset.state, row.querySelector("b").textContent.replace(/[:,].*/, "")])];
    for (const [state, words] of choices) {
      const button = make("button", words, { type: "button", value: state, "aria-pressed": String(state === "") });
      button.addEventListener("click", () => pick(state));
      picker.append(button);
    }
    rows[0].parentElement.after(picker);
    document.addEventListener("keydown", (event) => { if (event.key === "Escape") pick(""); });
  }

  const valueOf = (row, column) => {
    const cell = row.children[column];
    const value = cell.dataset.value;
    return value === undefined ? cell.textContent : Number(value);
  };
  const sort = (table, column, head) => {
    // Numbers show the largest first, words the first of the alphabet.
    const numbers = [...table.tBodies[0].rows].some((row) => typeof valueOf(row, column) === "number");
    const before = head.getAttribute("aria-sort");
    const down = before === null ? numbers : before === "ascending";
    const sign = down ? -1 : 1;
    for (const other of all("th[aria-sort]", table)) other.removeAttribute("aria-sort");
    head.setAttribute("aria-sort", down ? "descending" : "ascending");
    const compare = (a, b) => {
      const [x, y] = [valueOf(a, column), valueOf(b, column)];
      return typeof x === "number" && typeof y === "number" ? sign * (x - y) : sign * String(x).localeCompare(String(y), "en", { numeric: true });
    };
    table.tBodies[0].append(...[...table.tBodies[0].rows].sort(compare));
  };
  for (const table of all("table.sortable")) {
    all("thead th", table).forEach((head, column) => {
      const button = make("button", head.textContent, { type: "button", title: "sort by this column" });
      head.replaceChildren(button);
      button.addEventListener("click", () => sort(table, column, head));
    });
  }
})();`;
