// The page: what is chosen, how it is coloured, and the words beside the picture.

(() => {
  const scene = JSON.parse(document.getElementById("scene").textContent);
  const frame = scene.frame;
  const byId = id => document.getElementById(id);
  const [canvas, panel, legend, overlay] = ["canvas", "panel", "legend", "overlay"].map(byId);
  const rows = [...document.querySelectorAll("#tubes tbody tr")];
  let mesh;
  let view;
  let chosen = -1;
  let shifts;
  let largest = [];

  byId("view").hidden = false;
  try {
    mesh = readFrame(scene);
    view = new FrameView(canvas, mesh, frame.view, drawOverlay);
  } catch (problem) {
    byId("view").hidden = true;
    byId("no-view").prepend("This browser can’t show the picture in 3D (WebGL 2 is missing). ");
    return;
  }
  byId("frame").classList.add("shown");
  shifts = new Float32Array(mesh.positions.length / 3);
  canvas.addEventListener("webglcontextlost", () => { byId("frame").classList.remove("shown"); byId("view").hidden = true; });

  // Words

  const make = (name, text, parent) => {
    const element = document.createElement(name);
    if (text !== undefined) { element.textContent = text; }
    if (parent) { parent.append(element); }
    return element;
  };
  const digits = n => n === 0 ? "0" : n.toFixed(Math.max(0, Math.min(6, 2 - Math.floor(Math.log10(Math.abs(n))))));
  const length = mm => `${digits(mm * frame.lengthScale)} ${frame.lengthUnit}`;
  const percent = share => `${(100 * share).toFixed(1)} %`;

  function list(pairs, kind, parent) {
    const dl = make("dl", undefined, parent);
    dl.className = kind;
    for (const [name, value] of pairs) {
      const div = make("div", undefined, dl);
      make("dt", name, div);
      make("dd", value, div);
    }
  }

  function tell() {
    panel.replaceChildren();
    if (chosen < 0) {
      make("h3", "No tube chosen", panel);
      make("p", "Click a tube in the picture, or its name in the table below.", panel).className = "fine";
      return;
    }
    const tube = mesh.tubes[chosen];
    make("h3", tube.name, panel);
    list([
      ["mark", tube.mark], ["section", tube.section], ["material", tube.material], ["group", frame.groups[tube.group]],
      ["cut length", tube.cutLength], ["mass", tube.mass], ["from", tube.from], ["to", tube.to],
    ], "", panel);
    const limits = frame.limits.map((name, i) => [name, tube.uses[i]]).filter(([, use]) => use !== null);
    if (limits.length > 0) {
      make("h4", "Use of each limit", panel);
      list(limits.map(([name, use]) => [name, percent(use) + (use > 1 ? " MISSED" : "")]), "limits", panel);
    }
    if (tube.stress.length > 0) {
      make("h4", "Highest stress, case by case", panel);
      list(tube.stress.map((text, i) => [frame.cases[i].name, text]), "", panel);
      if (tube.motions.length > 0) {
        make("h4", "Moves at most", panel);
        list(frame.cases.map((c, i) => [c.name, length(mostOf(tube, i))]), "", panel);
      }
    }
  }

  function mostOf(tube, index) {
    const m = tube.motions[index];
    let most = 0;
    for (let i = 0; m && i < m.length; i += 6) { most = Math.max(most, Math.hypot(m[i], m[i + 1], m[i + 2])); }
    return most;
  }

  function choose(index, fromTable) {
    chosen = index;
    rows.forEach((row, i) => {
      row.classList.toggle("chosen", i === index);
      row.querySelector("button").setAttribute("aria-pressed", String(i === index));
    });
    tell();
    paint();
    if (fromTable) { byId("view").scrollIntoView({ block: "nearest" }); }
  }

  // Colours

  let inks = {};
  function readInks() {
    const style = getComputedStyle(document.documentElement);
    const ink = name => {
      const hex = style.getPropertyValue(`--${name}`).trim();
      const wide = hex.length === 4 ? [...hex.slice(1)].map(c => c + c).join("") : hex.slice(1);
      return [0, 2, 4].map(i => parseInt(wide.slice(i, i + 2), 16));
    };
    inks = {};
    for (const name of ["sheet", "low", "middle", "high", "over", "unknown", "edge", "chosen", "ghost"]) { inks[name] = ink(name); }
    inks.groups = [0, 1, 2, 3, 4, 5, 6, 7].map(i => ink(`g${i}`));
    const shares = c => c.map(n => n / 255);
    view.setInks(shares(inks.sheet), shares(inks.edge), shares(inks.ghost));
  }

  function ramp(share) {
    const s = Math.max(0, Math.min(1, share)) * 2;
    const [a, b] = s < 1 ? [inks.low, inks.middle] : [inks.middle, inks.high];
    return a.map((n, k) => n + (b[k] - n) * (s < 1 ? s : s - 1));
  }

  const colourBy = () => byId("colour").value;
  const caseIndex = () => Number(byId("case").value || 0);

  function paint() {
    const by = colourBy();
    const colours = new Uint8Array(4 * shifts.length);
    const top = largest[caseIndex()] || 1;
    mesh.tubes.forEach((tube, t) => {
      const even = by === "group" ? inks.groups[tube.group % inks.groups.length]
        : tube.use === null ? inks.unknown
        : tube.use > 1 ? inks.over
        : ramp(tube.use);
      for (let i = tube.first; i < tube.first + tube.count; i++) {
        const colour = t === chosen ? inks.chosen : by === "shift" ? ramp(shifts[i] / top) : even;
        colours.set(colour, 4 * i);
        colours[4 * i + 3] = mesh.inside[i] ? 255 : 0;
      }
    });
    view.setColours(colours);
  }

  function explain() {
    legend.replaceChildren();
    const swatch = (text, variable) => {
      const span = make("span", undefined, legend);
      make("i", undefined, span).style.background = `var(--${variable})`;
      span.append(text);
    };
    const scale = (low, high) => {
      const span = make("span", low, legend);
      span.className = "ramp";
      make("i", undefined, span);
      span.append(high);
    };
    if (colourBy() === "group") {
      frame.groups.forEach((name, i) => swatch(name, `g${i % 8}`));
    } else if (colourBy() === "shift") {
      scale("0", `${length(largest[caseIndex()] || 0)} along the tubes`);
      make("span", `${frame.cases[caseIndex()].name}: moves ${frame.cases[caseIndex()].moves}`, legend);
    } else {
      scale("0", "100 % of the nearest limit");
      if (mesh.tubes.some(t => t.use > 1)) { swatch("more than the limit", "over"); }
      if (mesh.tubes.some(t => t.use === null)) { swatch("no limit on single tubes", "unknown"); }
    }
    if (chosen >= 0) { swatch("chosen", "chosen"); }
  }

  // Deflections

  // The slider's far end shows the case's largest deflection as a tenth of the frame.
  function factor() {
    const slider = Number(byId("scale").value);
    const top = largest[caseIndex()];
    if (slider === 0 || !(top > 0)) { return 0; }
    const most = 0.1 * mesh.size / top;
    const exact = Math.pow(slider / 100, 2) * most;
    const round = Math.pow(10, Math.floor(Math.log10(exact)) - 1);
    return exact < 1 ? exact : Math.round(exact / round) * round;
  }

  function deflect() {
    const times = factor();
    const text = times === 0 ? "off" : `${times < 10 ? times.toPrecision(2) : Math.round(times)} times`;
    byId("scale-text").textContent = text;
    byId("scale").setAttribute("aria-valuetext", text);
    placeFrame(mesh, caseIndex(), times, shifts);
    view.setPlaces();
    const ghost = times === 0 ? [] : mesh.tubes.flatMap(axisLines);
    view.setGhost(new Float32Array(ghost));
    paint();
    explain();
  }

  function showControls() {
    const moves = frame.cases.length > 0 && mesh.tubes.every(t => t.motions.length > 0);
    byId("case-label").hidden = !moves;
    byId("scale-label").hidden = !moves;
    byId("colour").querySelector("[value=shift]").disabled = !moves;
  }

  // Over the picture: directions, and the nodes' names.

  const SVG = "http://www.w3.org/2000/svg";
  const draw = (name, attributes, text) => {
    const element = document.createElementNS(SVG, name);
    for (const [key, value] of Object.entries(attributes)) { element.setAttribute(key, value); }
    if (text !== undefined) { element.textContent = text; }
    overlay.append(element);
  };

  function drawOverlay() {
    overlay.replaceChildren();
    const [ox, oy, size] = [44, view.height - 44, 28];
    [["x", [1, 0, 0]], ["y", [0, 1, 0]], ["z", [0, 0, 1]]].forEach(([name, axis]) => {
      const [x, y] = [size * dot(axis, view.right), -size * dot(axis, view.up)];
      draw("line", { x1: ox, y1: oy, x2: ox + x, y2: oy + y });
      draw("text", { x: ox + 1.35 * x - 4, y: oy + 1.35 * y + 4 }, name);
    });
    if (byId("names").checked) {
      frame.nodes.forEach(node => {
        const [x, y] = view.place(node.at);
        draw("text", { x: x + 6, y: y - 6 }, node.name);
      });
    }
  }

  // Hands

  const fingers = new Map();
  let pressed = null;
  const at = event => {
    const box = canvas.getBoundingClientRect();
    return [event.clientX - box.left, event.clientY - box.top];
  };
  canvas.addEventListener("pointerdown", event => {
    canvas.setPointerCapture(event.pointerId);
    canvas.focus({ preventScroll: true });
    fingers.set(event.pointerId, at(event));
    pressed = fingers.size === 1 ? { at: at(event), moved: false, moves: event.button === 2 || event.shiftKey } : null;
    canvas.classList.add("turning");
  });
  canvas.addEventListener("pointermove", event => {
    if (!fingers.has(event.pointerId)) { return; }
    const before = fingers.get(event.pointerId);
    const now = at(event);
    if (fingers.size === 2) {
      const other = [...fingers].find(([id]) => id !== event.pointerId)[1];
      const spread = p => Math.hypot(p[0] - other[0], p[1] - other[1]) || 1;
      view.move((now[0] - before[0]) / 2, (now[1] - before[1]) / 2);
      view.zoom(spread(now) / spread(before), (now[0] + other[0]) / 2, (now[1] + other[1]) / 2);
    } else if (pressed) {
      pressed.moved = pressed.moved || Math.hypot(now[0] - pressed.at[0], now[1] - pressed.at[1]) > 4;
      if (pressed.moved && pressed.moves) {
        view.move(now[0] - before[0], now[1] - before[1]);
      } else if (pressed.moved) {
        view.turn(-0.4 * (now[0] - before[0]), 0.4 * (now[1] - before[1]));
      }
    }
    fingers.set(event.pointerId, now);
  });
  const lift = event => {
    fingers.delete(event.pointerId);
    canvas.classList.remove("turning");
    if (event.type === "pointerup" && pressed && !pressed.moved && event.button === 0) {
      choose(view.pick(...at(event)));
      explain();
    }
    pressed = null;
  };
  canvas.addEventListener("pointerup", lift);
  canvas.addEventListener("pointercancel", lift);
  canvas.addEventListener("contextmenu", event => event.preventDefault());
  canvas.addEventListener("wheel", event => {
    // Scrolling the page past the picture stays possible: only a picture in use zooms.
    if (document.activeElement !== canvas && !event.ctrlKey) { return; }
    event.preventDefault();
    view.zoom(Math.exp(-event.deltaY * (event.deltaMode === 1 ? 0.03 : 0.0015)), ...at(event));
  }, { passive: false });

  const step = by => choose((chosen + by + mesh.tubes.length + (chosen < 0 && by < 0 ? 1 : 0)) % mesh.tubes.length);
  const keys = {
    ArrowLeft: e => e.shiftKey ? view.move(-25, 0) : view.turn(-6, 0),
    ArrowRight: e => e.shiftKey ? view.move(25, 0) : view.turn(6, 0),
    ArrowUp: e => e.shiftKey ? view.move(0, -25) : view.turn(0, 6),
    ArrowDown: e => e.shiftKey ? view.move(0, 25) : view.turn(0, -6),
    "+": () => view.zoom(1.2, view.width / 2, view.height / 2),
    "=": () => view.zoom(1.2, view.width / 2, view.height / 2),
    "-": () => view.zoom(1 / 1.2, view.width / 2, view.height / 2),
    f: () => view.fit(),
    n: () => step(1),
    p: () => step(-1),
    Escape: () => choose(-1),
  };
  canvas.addEventListener("keydown", event => {
    const act = keys[event.key.length === 1 ? event.key.toLowerCase() : event.key];
    if (act && !event.ctrlKey && !event.metaKey && !event.altKey) {
      event.preventDefault();
      act(event);
      explain();
    }
  });

  // Set-up

  frame.cases.forEach((c, i) => { make("option", c.name, byId("case")).value = i; });
  rows.forEach((row, i) => {
    const name = row.querySelector(".tube");
    const button = make("button", name.textContent);
    button.type = "button";
    button.setAttribute("aria-pressed", "false");
    button.addEventListener("click", () => { choose(i, true); explain(); });
    name.replaceWith(button);
  });
  byId("colour").addEventListener("change", () => {
    if (colourBy() === "shift" && byId("scale").value === "0") { byId("scale").value = "60"; }
    deflect();
  });
  byId("case").addEventListener("change", deflect);
  byId("scale").addEventListener("input", deflect);
  byId("names").addEventListener("change", () => view.redraw());
  byId("fit").addEventListener("click", () => view.fit());
  document.querySelectorAll("[data-view]").forEach(button => button.addEventListener("click", () => {
    view.turnTo(...button.dataset.view.split(",").map(Number));
    view.fit();
  }));
  matchMedia("(prefers-color-scheme: dark)").addEventListener("change", () => { readInks(); paint(); });

  largest = frame.cases.map((_, i) => mesh.tubes.reduce((most, t) => Math.max(most, mostOf(t, i)), 0));
  readInks();
  showControls();
  byId("scale").value = "0";
  placeFrame(mesh, 0, 0, shifts);
  view.fit();
  mesh.size = view.reach;
  deflect();
  tell();
})();
